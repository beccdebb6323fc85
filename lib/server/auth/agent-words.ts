import 'server-only';

/** In this order: most browsers also name the ones they descend from. */
const BROWSERS: readonly [mark: RegExp, words: string][] = [
  [/\bEdg(e|A|iOS)?\//, 'Edge'],
  [/\bOPR\//, 'Opera'],
  [/\bSamsungBrowser\//, 'Samsung Internet'],
  [/\bFirefox\/|\bFxiOS\//, 'Firefox'],
  [/\bChrom(e|ium)\/|\bHeadlessChrome\/|\bCriOS\//, 'Chrome'],
  [/\bSafari\//, 'Safari'],
];

const SYSTEMS: readonly [mark: RegExp, words: string][] = [
  [/\bAndroid\b/, 'Android'],
  [/\biPhone\b/, 'an iPhone'],
  [/\biPad\b/, 'an iPad'],
  [/\bCrOS\b/, 'a Chromebook'],
  [/\bWindows\b/, 'Windows'],
  [/\bMac OS X\b/, 'a Mac'],
  [/\bLinux\b/, 'Linux'],
];

function firstMatch(table: readonly [RegExp, string][], agent: string): string | null {
  return table.find(([mark]) => mark.test(agent))?.[1] ?? null;
}

/**
 * A browser in words its owner recognises: `Firefox on Windows`. Nothing else of the header is kept, so that a list
 * of sign-ins tells no versions and no places.
 *
 * @param agent the `User-Agent` header.
 */
export function agentWords(agent: string): string {
  const browser = firstMatch(BROWSERS, agent) ?? 'another program';
  const system = firstMatch(SYSTEMS, agent);
  return system ? `${browser} on ${system}` : browser;
}
