/** Browser and system in words, from what the browser says of itself; guesses nothing else. */
export function describeDevice(userAgent: string): string {
  const browser = firstMatch(userAgent, [
    [/\bFirefox\//, 'Firefox'],
    [/\bEdg\//, 'Edge'],
    [/\bOPR\//, 'Opera'],
    [/\b(Chrome|Chromium|CriOS)\//, 'Chrome'],
    [/\bSafari\//, 'Safari'],
  ]);
  const system = firstMatch(userAgent, [
    [/\b(iPhone|iPad)\b/, 'iPhone or iPad'],
    [/\bAndroid\b/, 'Android'],
    [/\bWindows\b/, 'Windows'],
    [/\bMac OS X\b/, 'Mac'],
    [/\bLinux\b/, 'Linux'],
  ]);
  if (!browser && !system) return 'An unknown device';
  return [browser ?? 'A browser', system ? `on ${system}` : ''].join(' ').trim();
}

function firstMatch(text: string, table: [RegExp, string][]): string | null {
  return table.find(([pattern]) => pattern.test(text))?.[1] ?? null;
}
