const browsers: readonly [RegExp, string][] = [
  [/\bEdg\//, 'Edge'],
  [/\bOPR\//, 'Opera'],
  [/\bFirefox\//, 'Firefox'],
  [/\bChrome\/|\bHeadlessChrome\//, 'Chromium'],
  [/\bSafari\//, 'Safari'],
];

const systems: readonly [RegExp, string][] = [
  [/\biPhone|\biPad/, 'iOS'],
  [/\bAndroid/, 'Android'],
  [/\bWindows/, 'Windows'],
  [/\bMac OS X/, 'macOS'],
  [/\bLinux/, 'Linux'],
];

const find = (rules: readonly [RegExp, string][], text: string): string | undefined =>
  rules.find(([pattern]) => pattern.test(text))?.[1];

/** A browser's long self-description in two words: `Firefox on Linux`. */
export function describeDevice(userAgent: string | null): string {
  const browser = find(browsers, userAgent ?? '');
  const system = find(systems, userAgent ?? '');
  if (browser === undefined) {
    return system === undefined ? 'Unknown device' : `A program on ${system}`;
  }
  return system === undefined ? browser : `${browser} on ${system}`;
}
