/** How far the background sways to either side, and the frames of one sway. */
const SWAY_PX = 40;
const SWAY_FRAMES = 240;

/** A plain room of slow waves of colour that sways behind the face: gives its red, green and blue for the frame of a number. */
export function swayingBackground(width: number, height: number): (number: number, into: Float32Array) => void {
  const wide = width + 2 * SWAY_PX;
  const room = new Float32Array(wide * height * 3);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < wide; x++) {
      for (let k = 0; k < 3; k++) {
        const wave = 40 * Math.sin(x / 97 + k) + 30 * Math.cos(y / 71 - k) + 10 * Math.sin((x + y) / 29);
        room[(y * wide + x) * 3 + k] = 120 + wave;
      }
    }
  }
  return (number, into) => {
    const left = SWAY_PX + Math.round(SWAY_PX * Math.sin((2 * Math.PI * number) / SWAY_FRAMES));
    for (let y = 0; y < height; y++) {
      const from = (y * wide + left) * 3;
      into.set(room.subarray(from, from + width * 3), y * width * 3);
    }
  };
}
