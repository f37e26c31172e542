// In this order, because most browsers also name those they descend from.
const browsers = [
  [/Edg\//, 'Edge'],
  [/OPR\//, 'Opera'],
  [/Firefox\//, 'Firefox'],
  [/Chrom(e|ium)\//, 'Chromium'],
  [/Safari\//, 'Safari'],
] as const
const systems = [
  [/iPhone/, 'iPhone'],
  [/iPad/, 'iPad'],
  [/Android/, 'Android'],
  [/Windows/, 'Windows'],
  [/Mac OS X/, 'Mac'],
  [/CrOS/, 'Chromebook'],
  [/Linux/, 'Linux'],
] as const

/** What a browser says of itself, in words its owner knows a session by: 'Firefox on Windows'. */
export function deviceWords(userAgent: string | null): string {
  const [browser, system] = [browsers, systems].map(
    list => list.find(([pattern]) => pattern.test(userAgent ?? ''))?.[1],
  )
  if (browser === undefined) return system ?? 'An unknown device'
  return system === undefined ? browser : `${browser} on ${system}`
}
