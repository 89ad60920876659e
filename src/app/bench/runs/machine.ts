/** What this runs on, in the browser's own words: no serial numbers, at most 300 signs. */
export function machineWords({ userAgent, hardwareConcurrency }: Navigator, { width, height }: Screen): string {
  return `${hardwareConcurrency} processors; screen ${width} x ${height}; ${userAgent}`.slice(0, 300);
}

/** The first that a browser's words (RFC 9110, 10.1.5) match says what it is: those built on another name that one too. */
const engines: readonly (readonly [name: string, token: RegExp])[] = [
  ['Firefox', /Firefox\/(\d+)/],
  ['Chromium', /Chrom(?:e|ium)\/(\d+)/],
  ['Safari', /Version\/(\d+)[\d.]* (?:Mobile\/\S+ )?Safari\//],
];
const systems: readonly (readonly [name: string, token: RegExp])[] = [
  ['Android', /Android/],
  ['iPad or iPhone', /iPad|iPhone/],
  ['ChromeOS', /CrOS/],
  ['Linux on Arm', /Linux (?:aarch64|arm)/],
  ['Linux', /Linux/],
  ['macOS', /Mac OS X/],
  ['Windows', /Windows/],
];

/** A machine in few words, “Chromium 143 on Linux, 4 cores”; what is not recognised stays as it was recorded. */
export function machineName(words: string): string {
  const engine = engines.map(([name, token]) => [name, token.exec(words)?.[1]] as const).find(([, version]) => version);
  const system = systems.find(([, token]) => token.test(words));
  if (!engine || !system) return words;
  const cores = Number(/^(\d+) processors;/.exec(words)?.[1]);
  const has = cores > 0 ? `, ${cores} ${cores === 1 ? 'core' : 'cores'}` : '';
  return `${engine.join(' ')} on ${system[0]}${has}`;
}
