import { describe, expect, it } from 'vitest';

import { readReturnAddress, signInAddress } from '#client/lib/return-address.ts';

const read = (address: string): string =>
  readReturnAddress(new URL(address, 'http://holdfast.example').searchParams);

describe('return address', () => {
  it('survives the way there and back', () => {
    const wanted = '/w/kiln-lane/lattices/7?section=energy#top';
    expect(read(signInAddress(wanted, 'expired'))).toBe(wanted);
    expect(signInAddress('/')).toBe('/sign-in');
  });

  it.each(['https://elsewhere.example/', '//elsewhere.example', '/\\elsewhere.example', 'w/x', ''])(
    'never leaves this site: %s',
    (to) => {
      expect(read(`/sign-in?to=${encodeURIComponent(to)}`)).toBe('/');
    },
  );

  it('does not lead round in a circle', () => {
    expect(read('/sign-in?to=/sign-in')).toBe('/');
  });
});
