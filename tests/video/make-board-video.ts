import { writeFile } from 'node:fs/promises';
import { parseArgs } from 'node:util';
import { boardLight, boardPoses, cardLight, type FilmSize, makeFilm } from './board-film';

const USAGE = 'npm run video:board -- --out FILE (without ending) [--field DEGREES]';
const square = [0, 0, 0] as const;
const cardsAwayMm = [200, 480];

/** The printed board held in nine poses for two seconds each, then a card near and far for four: to try the measuring of a camera by hand. */
async function main(): Promise<void> {
  const { values } = parseArgs({ options: { out: { type: 'string' }, field: { type: 'string', default: '60' } } });
  const fieldDegrees = Number(values.field);
  if (!values.out || !(fieldDegrees > 0 && fieldDegrees < 180)) throw new Error(`Say where to write: ${USAGE}`);
  const size: FilmSize = { width: 640, height: 480, fps: 30, hfovRad: (fieldDegrees * Math.PI) / 180 };
  const things = [
    ...boardPoses.map((pose) => ({ ...pose, frames: 60, light: boardLight })),
    ...cardsAwayMm.map((away) => ({ turn: square, place: [4, -3, away] as const, frames: 120, light: cardLight })),
  ];
  await makeFilm(`${values.out}.mjpeg`, size, things);
  const truth = { ...size, things: things.map(({ turn, place, frames }) => ({ turn, placeMm: place, frames })) };
  await writeFile(`${values.out}.json`, JSON.stringify(truth));
  console.log(`A board and a card in ${values.out}.mjpeg, where they were held in ${values.out}.json`);
}

main().catch((cause: unknown) => {
  console.error(cause instanceof Error ? cause.message : cause);
  process.exitCode = 1;
});
