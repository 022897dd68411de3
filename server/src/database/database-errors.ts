interface ServerError {
  readonly code: string;
  readonly constraint: string | undefined;
}

/** The PostgreSQL error below whatever wrapped it, or null. */
function serverError(error: unknown): ServerError | null {
  for (let at = error, depth = 0; at instanceof Error && depth < 5; at = at.cause, depth += 1) {
    const { code, constraint } = at as Error & { code?: unknown; constraint?: unknown };
    if (typeof code === 'string' && /^[0-9A-Z]{5}$/.test(code)) {
      return { code, constraint: typeof constraint === 'string' ? constraint : undefined };
    }
  }
  return null;
}

/** Whether a statement failed on this unique constraint (on any, when none is named). */
export function isUniqueViolation(error: unknown, constraint?: string): boolean {
  const found = serverError(error);
  return found?.code === '23505' && (constraint === undefined || found.constraint === constraint);
}

/** Whether a statement failed on this check constraint or trigger. */
export function isCheckViolation(error: unknown, constraint: string): boolean {
  const found = serverError(error);
  return found?.code === '23514' && found.constraint === constraint;
}
