import type { SpaceGroupSetting } from '#common/schemas/symmetry';

const squeeze = (text: string): string => text.toLowerCase().replace(/[\s_]/g, '');

/** How well a setting fits what was typed; null where it does not. Lower is better. */
function rank(setting: SpaceGroupSetting, wanted: string): number | null {
  const symbol = squeeze(setting.symbol);
  const standard = setting.isStandard ? 0 : 1;
  if (/^\d+$/.test(wanted)) {
    const number = String(setting.number);
    if (number === wanted) {
      return standard;
    }
    return number.startsWith(wanted) ? 10 + setting.number / 1000 + standard : null;
  }
  if (symbol === wanted) {
    return standard;
  }
  if (symbol.startsWith(wanted)) {
    return 4 + standard;
  }
  if (symbol.includes(wanted) || squeeze(setting.hallSymbol) === wanted) {
    return 6 + standard;
  }
  return setting.crystalSystem.startsWith(wanted) ? 8 + standard : null;
}

/** Settings that fit a number, a symbol with or without spaces, or a crystal system; best first. */
export function searchSpaceGroups(
  settings: readonly SpaceGroupSetting[],
  typed: string,
): readonly SpaceGroupSetting[] {
  const wanted = squeeze(typed.replaceAll('−', '-'));
  if (wanted === '') {
    return settings.filter((setting) => setting.isStandard);
  }
  return settings
    .flatMap((setting) => {
      const fit = rank(setting, wanted);
      return fit === null ? [] : [{ setting, fit }];
    })
    .toSorted((one, other) => one.fit - other.fit || one.setting.number - other.setting.number)
    .map(({ setting }) => setting);
}

/** What tells one setting of a group from another, in words; empty where there is but one. */
export function settingWords(setting: SpaceGroupSetting): string {
  const { setting: code } = setting;
  if (setting.crystalSystem === 'trigonal' && /^[HR]$/.test(code)) {
    return code === 'H' ? 'hexagonal axes' : 'rhombohedral axes';
  }
  if (/^[12]$/.test(code)) {
    return `origin choice ${code}`;
  }
  return code === '' ? '' : `setting ${code}`;
}
