import 'express-session';

declare module 'express-session' {
  interface SessionData {
    userId: string;
    /** Names the session in lists; opens nothing. */
    publicId: string;
    /** Sign-in, Unix time in milliseconds. */
    startedAt: number;
    address: string | null;
    userAgent: string | null;
  }
}

/** What a stored session holds of ours. */
export interface StoredSession {
  readonly userId: string;
  readonly publicId: string;
  readonly startedAt: number;
  readonly address: string | null;
  readonly userAgent: string | null;
}
