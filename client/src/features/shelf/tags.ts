/** As in the contract of a lattice. */
export const tagLimits = { count: 12, length: 30 } as const;

interface MergedTags {
  tags: readonly string[];
  /** What is wrong and how to mend it; the tags are then as they were. */
  problem: string | null;
}

/** Adds what was typed, commas between, to the tags; none twice, whatever the capitals. */
export function mergeTags(tags: readonly string[], typed: string): MergedTags {
  const merged = [...tags];
  for (const tag of typed.split(',').map((part) => part.trim())) {
    if (tag.length > tagLimits.length) {
      return { tags, problem: `Keep a tag to ${tagLimits.length} characters.` };
    }
    if (tag !== '' && !merged.some((one) => one.toLowerCase() === tag.toLowerCase())) {
      merged.push(tag);
    }
  }
  return merged.length > tagLimits.count
    ? { tags, problem: `A lattice takes ${tagLimits.count} tags at most.` }
    : { tags: merged, problem: null };
}
