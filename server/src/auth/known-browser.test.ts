import { describe, expect, it } from 'vitest';

import { cookieValue, issueKnownBrowser, readKnownBrowser } from './known-browser.js';

const secret = 'a secret of enough characters to sign with';

describe('known browsers', () => {
  it('are known to the account they were issued for', () => {
    const cookie = issueKnownBrowser('ida@kiln.example', secret);
    expect(readKnownBrowser(cookie, 'ida@kiln.example', secret)).toBe(cookie.split('.')[0]);
  });

  it('are unknown to others, with another key, and when tampered with', () => {
    const cookie = issueKnownBrowser('ida@kiln.example', secret);
    const tampered = (cookie.startsWith('A') ? 'B' : 'A') + cookie.slice(1);
    expect(readKnownBrowser(cookie, 'ole@kiln.example', secret)).toBeNull();
    expect(readKnownBrowser(cookie, 'ida@kiln.example', `${secret}!`)).toBeNull();
    expect(readKnownBrowser(tampered, 'ida@kiln.example', secret)).toBeNull();
    expect(readKnownBrowser('', 'ida@kiln.example', secret)).toBeNull();
    expect(readKnownBrowser(undefined, 'ida@kiln.example', secret)).toBeNull();
  });

  it('are found among other cookies', () => {
    expect(cookieValue('a=1; holdfast.browser=x.y; b=2', 'holdfast.browser')).toBe('x.y');
    expect(cookieValue('xholdfast.browser=1', 'holdfast.browser')).toBeUndefined();
    expect(cookieValue(undefined, 'holdfast.browser')).toBeUndefined();
  });
});
