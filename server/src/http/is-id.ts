import { id } from '#common/schemas/shared';

/** Whether a text of an address can be the id of anything; PostgreSQL refuses other texts. */
export const isId = (text: string): boolean => id.safeParse(text).success;
