/**
 * Splits a raw MJPEG stream into its pictures: each runs from a start-of-image marker (FF D8) to the last end-of-image marker (FF D9)
 * before the next start (ITU-T T.81, B.1.1.3; within coded data FF is always followed by 00 or a restart marker).
 */
export function splitJpegs(stream: Uint8Array): Uint8Array<ArrayBuffer>[] {
  const starts: number[] = [];
  for (let at = 0; at + 2 < stream.length; at++) {
    const begins = stream[at] === 0xff && stream[at + 1] === 0xd8 && stream[at + 2] === 0xff;
    if (begins && (at === 0 || endsBefore(stream, at))) starts.push(at);
  }
  return starts.map((start, k) => stream.slice(start, starts[k + 1] ?? stream.length));
}

const endsBefore = (stream: Uint8Array, at: number): boolean => stream[at - 2] === 0xff && stream[at - 1] === 0xd9;
