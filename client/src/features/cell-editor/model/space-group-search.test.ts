import { describe, expect, it } from 'vitest';

import type { SpaceGroupSetting } from '#common/schemas/symmetry';
import {
  searchSpaceGroups,
  settingWords,
} from '#client/features/cell-editor/model/space-group-search.ts';

const setting = (
  hallNumber: number,
  number: number,
  symbol: string,
  more: Partial<SpaceGroupSetting> = {},
): SpaceGroupSetting => ({
  hallNumber,
  number,
  symbol,
  hallSymbol: '',
  setting: '',
  crystalSystem: 'cubic',
  hexagonalAxes: false,
  uniqueAxis: null,
  isStandard: true,
  ...more,
});

const settings = [
  setting(523, 225, 'F m -3 m'),
  setting(525, 227, 'F d -3 m', { setting: '1', isStandard: false }),
  setting(526, 227, 'F d -3 m', { setting: '2' }),
  setting(460, 167, 'R -3 c', { setting: 'H', crystalSystem: 'trigonal', hexagonalAxes: true }),
  setting(419, 136, 'P 42/m n m', { crystalSystem: 'tetragonal' }),
];
const found = (typed: string): number[] =>
  searchSpaceGroups(settings, typed).map((one) => one.hallNumber);

describe('searchSpaceGroups', () => {
  it('finds by number, standard setting first', () => {
    expect(found('227')).toEqual([526, 525]);
    expect(found('22')).toEqual([523, 526, 525]);
  });

  it('finds by symbol with and without spaces', () => {
    expect(found('Fm-3m')).toEqual([523]);
    expect(found('f m −3 m')).toEqual([523]);
    expect(found('P42/mnm')).toEqual([419]);
  });

  it('finds by crystal system and shows standard settings when nothing is typed', () => {
    expect(found('trig')).toEqual([460]);
    expect(found('')).toEqual([523, 526, 460, 419]);
    expect(found('zzz')).toEqual([]);
  });
});

describe('settingWords', () => {
  it('says what the code means', () => {
    expect(settingWords(settings[1]!)).toBe('origin choice 1');
    expect(settingWords(settings[3]!)).toBe('hexagonal axes');
    expect(settingWords(settings[0]!)).toBe('');
  });
});
