import { describe, expect, it } from 'vitest';

import {
  readLatticeAddress,
  writeLatticeAddress,
} from '#client/features/lattices/hooks/use-lattice-address.ts';

describe('the address of a lattice page', () => {
  it('survives being written and read', () => {
    const change = {
      section: 'remarks',
      revision: 3,
      picked: ['0.0.0.0', '4.1.0.-1'],
      row: 'Mg+2|O-2|2.106',
      reachA: 7.25,
      view: 'neutralised',
      repeat: [2, 2, 1],
      camera: { azimuthDeg: 40, elevationDeg: 10, zoom: 1.5, panX: 0, panY: 0 },
      remark: 2,
    } as const;
    const written = writeLatticeAddress(new URLSearchParams(), change);
    expect(readLatticeAddress(new URLSearchParams(written.toString()))).toEqual(change);
  });

  it('leaves no trace of defaults and keeps what it does not know', () => {
    const written = writeLatticeAddress(new URLSearchParams('renderer=cpu&rev=2'), {
      section: 'energy',
      revision: null,
      picked: [],
      repeat: [1, 1, 1],
    });
    expect(written.toString()).toBe('renderer=cpu');
  });

  it('takes nonsense as not given', () => {
    const address = readLatticeAddress(
      new URLSearchParams('section=xyz&rev=-1&rep=0x1x1&cam=a,b&reach=NaN&ledger=other'),
    );
    expect(address).toMatchObject({
      section: 'energy',
      revision: null,
      repeat: [1, 1, 1],
      camera: null,
      reachA: null,
      view: 'bare',
    });
  });
});
