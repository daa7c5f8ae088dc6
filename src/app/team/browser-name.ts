/** Browsers by the word that only they send, those first that also carry the words of others. */
const BROWSERS: readonly (readonly [RegExp, string])[] = [
  [/Edg(?:e|A|iOS)?\/(\d+)/, 'Edge'],
  [/OPR\/(\d+)/, 'Opera'],
  [/SamsungBrowser\/(\d+)/, 'Samsung Internet'],
  [/(?:Firefox|FxiOS)\/(\d+)/, 'Firefox'],
  [/(?:Chrome|CriOS|Chromium|HeadlessChrome)\/(\d+)/, 'Chrome'],
  [/Version\/(\d+)[\d.]* (?:Mobile\/\w+ )?Safari/, 'Safari'],
];

const SYSTEMS: readonly (readonly [RegExp, string])[] = [
  [/Android/, 'Android'],
  [/iPhone|iPad/, 'iOS'],
  [/Windows/, 'Windows'],
  [/Mac OS X|Macintosh/, 'macOS'],
  [/CrOS/, 'ChromeOS'],
  [/Linux|X11/, 'Linux'],
];

/** "Firefox 128 on Linux" from what a browser says of itself; what is not known is shown as it came, cut short. */
export function browserName(userAgent: string): string {
  const system = SYSTEMS.find(([pattern]) => pattern.test(userAgent))?.[1];
  for (const [pattern, name] of BROWSERS) {
    const version = pattern.exec(userAgent)?.[1];
    if (version !== undefined) return `${name} ${version}${system === undefined ? '' : ` on ${system}`}`;
  }
  return userAgent === '' ? 'unknown' : userAgent.slice(0, 60);
}
