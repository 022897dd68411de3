const hour = 3_600_000;

/** A session not used for this long ends: a long weekend and a bit, in milliseconds. */
export const sessionIdleMs = 7 * 24 * hour;

/** A session ends this long after its sign-in, however busy, in milliseconds. */
export const sessionAbsoluteMs = 30 * 24 * hour;

export const sessionCookieName = 'holdfast.session';
