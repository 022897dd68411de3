import { z } from 'zod';

import { dataValue } from '#common/schemas/energetics';
import { personSummary, timestamp } from '#common/schemas/shared';

/** Most values of its own that a workspace may keep. */
export const dataValuesLimit = 2_000;

/** A workspace's own value of a tabulated quantity; `note` says where it comes from. */
export const setDataValueRequest = dataValue.pick({ value: true, note: true });
export type SetDataValueRequest = z.infer<typeof setDataValueRequest>;

/** The same as kept: who put it there, and when. */
export const ownDataValue = dataValue.extend({ setBy: personSummary, setAt: timestamp });
export type OwnDataValue = z.infer<typeof ownDataValue>;

export const ownDataValueList = z.object({ items: z.array(ownDataValue) });
