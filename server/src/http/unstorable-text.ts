/** A character PostgreSQL does not take: NUL, or half of a surrogate pair. */
const isUnstorable = (text: string): boolean => text.includes('\0') || /\p{Surrogate}/u.test(text);

/** No contract is as deep; what is deeper is refused by its contract. */
const deepest = 32;

/**
 * Where a value holds text that can't be stored (`sites.0.label`), or null. The value comes from
 * JSON or a query, so it has no circles.
 */
export function findUnstorableText(value: unknown, path = '', depth = 0): string | null {
  if (typeof value === 'string') {
    return isUnstorable(value) ? path : null;
  }
  if (typeof value !== 'object' || value === null || depth > deepest) {
    return null;
  }
  for (const [key, entry] of Object.entries(value)) {
    const at = path === '' ? key : `${path}.${key}`;
    const found = isUnstorable(key) ? path : findUnstorableText(entry, at, depth + 1);
    if (found !== null) {
      return found;
    }
  }
  return null;
}
