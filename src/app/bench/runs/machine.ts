/** What this runs on, in the browser's own words: no serial numbers, at most 300 signs. */
export function machineWords({ userAgent, hardwareConcurrency }: Navigator, { width, height }: Screen): string {
  return `${hardwareConcurrency} processors; screen ${width} x ${height}; ${userAgent}`.slice(0, 300);
}
