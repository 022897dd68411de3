import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';

export const knownBrowserCookie = 'holdfast.browser';

/** How long a browser stays known after a sign-in, in milliseconds. */
export const knownBrowserMs = 180 * 24 * 3_600_000;

const signature = (email: string, nonce: string, secret: string): Buffer =>
  createHmac('sha256', secret).update(`known-browser\n${email}\n${nonce}`).digest();

/**
 * Proof that an account was signed in to from this browser (OWASP: slow down online guessing with
 * device cookies). Failed sign-ins of a known browser are counted apart from everyone else's, so a
 * stranger who keeps guessing can't keep the account's owner out. It opens nothing by itself.
 */
export function issueKnownBrowser(email: string, secret: string): string {
  const nonce = randomBytes(16).toString('base64url');
  return `${nonce}.${signature(email, nonce, secret).toString('base64url')}`;
}

/** The nonce of a proof that is valid for this account, else null. */
export function readKnownBrowser(
  cookie: string | undefined,
  email: string,
  secret: string,
): string | null {
  const match = /^([\w-]{22})\.([\w-]{43})$/.exec(cookie ?? '');
  if (match === null) {
    return null;
  }
  const [, nonce, given] = match as unknown as [string, string, string];
  return timingSafeEqual(Buffer.from(given, 'base64url'), signature(email, nonce, secret))
    ? nonce
    : null;
}

/** A cookie's value in a `Cookie` header. */
export function cookieValue(header: string | undefined, name: string): string | undefined {
  const pair = (header ?? '')
    .split(';')
    .map((part) => part.trim())
    .find((part) => part.startsWith(`${name}=`));
  return pair?.slice(name.length + 1);
}
