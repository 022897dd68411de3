import { z } from 'zod';

import { cellDefinition, evaluationMethod } from '#common/schemas/cell';
import { energeticModel } from '#common/schemas/energetics';
import type { UnsavedCopy } from '#client/features/cell-editor/model/draft-keeper.ts';

const unsavedCopy = z.object({
  etag: z.string(),
  content: z.object({ cell: cellDefinition, method: evaluationMethod, model: energeticModel }),
});

const keyOf = (latticeId: string): string => `holdfast.unsaved.${latticeId}`;

/** Keeps, or with null forgets, an edit on this device until the server has it. */
export function rememberUnsaved(latticeId: string, copy: UnsavedCopy | null): void {
  try {
    if (copy === null) {
      localStorage.removeItem(keyOf(latticeId));
    } else {
      localStorage.setItem(keyOf(latticeId), JSON.stringify(copy));
    }
  } catch {
    // Storage full or blocked: the edit still lives in this tab and is saved when the server answers.
  }
}

/** An edit left behind by a closed tab; null when there is none or it can't be read. */
export function recallUnsaved(latticeId: string): UnsavedCopy | null {
  try {
    const text = localStorage.getItem(keyOf(latticeId));
    const parsed = text === null ? null : unsavedCopy.safeParse(JSON.parse(text));
    return parsed?.success === true ? parsed.data : null;
  } catch {
    // Not JSON or not readable: nothing that could be restored.
    return null;
  }
}
