import { createHash, randomBytes } from 'node:crypto';

/** What a link carries: 32 random bytes, base64url. */
export const newSecretToken = (): string => randomBytes(32).toString('base64url');

/** What is stored of it: SHA-256, hexadecimal. The token has too many bits to be guessed from it. */
export const secretTokenHash = (token: string): string =>
  createHash('sha256').update(token).digest('hex');
