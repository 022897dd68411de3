/** A character PostgreSQL does not take: NUL, or half of a surrogate pair. */
const isUnstorable = (text: string): boolean => text.includes('\0') || /\p{Surrogate}/u.test(text);

/**
 * Where a value holds text that can't be stored (`sites.0.label`), or null. The value comes from
 * JSON or a query, so it has no circles.
 */
export function findUnstorableText(value: unknown, path = ''): string | null {
  if (typeof value === 'string') {
    return isUnstorable(value) ? path : null;
  }
  if (typeof value !== 'object' || value === null) {
    return null;
  }
  for (const [key, entry] of Object.entries(value)) {
    const at = path === '' ? key : `${path}.${key}`;
    const found = isUnstorable(key) ? path : findUnstorableText(entry, at);
    if (found !== null) {
      return found;
    }
  }
  return null;
}
