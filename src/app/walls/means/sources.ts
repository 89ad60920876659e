import { usualTuning } from '@oriel/shared/contracts/new-wall';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { CERTAIN, type SetUpUncertainty, glassErrorMm, middleOf } from '@oriel/shared/viewer/measuring/glass-error';
import { GeometryError } from '@oriel/shared/projection/geometry-error';
import { plainMm } from '../../figures/words';
import { degrees } from '../../screen/screen-measure';
import { cameraOf } from '../room/wall-room';

/** One figure of a set-up that is not certain. */
export interface Source {
  readonly key: 'glass' | 'position' | 'tilt' | 'field' | 'viewer';
  readonly name: string;
  /** Its standard uncertainty in words, "±2.1° of view". */
  readonly words: string;
  /** Whether nobody measured it, and the uncertainty is what is usual of such guesses. */
  readonly assumed: boolean;
  readonly unsure: SetUpUncertainty;
}

/** What a figure is taken to be wrong by until it is measured (practice): a sold size, a guess by eye, a maker's field of view. */
export const unmeasured = { glassScale: 0.01, positionMm: 10, tiltRad: (2 * Math.PI) / 180, hfovRad: (5 * Math.PI) / 180 } as const;

/** The depths for which it is said what an uncertainty means, mm. */
export const exampleDepths = [100, 500] as const;

export function sourcesOf({ glass, camera, tuning }: WallSetUp): Source[] {
  const { uncertainty } = camera;
  const scale = glass.uncertainty ?? unmeasured.glassScale;
  const place = uncertainty.positionMm ?? unmeasured.positionMm;
  const tilt = uncertainty.pitchRad ?? unmeasured.tiltRad;
  const field = uncertainty.hfovRad ?? unmeasured.hfovRad;
  const viewer = tuning.ipdMm.uncertainty / tuning.ipdMm.value;
  return [
    { key: 'glass', name: 'the size of the glass', words: `±${plainMm(scale * 100, 2)} % of its width`, assumed: glass.uncertainty === null, unsure: { ...CERTAIN, glassScale: scale } },
    { key: 'position', name: 'the place of the lens', words: `±${plainMm(place)} mm of the lens`, assumed: uncertainty.positionMm === null, unsure: { ...CERTAIN, positionMm: place } },
    { key: 'tilt', name: 'the turn of the camera', words: `±${plainMm(degrees(tilt), 2)}° of turn`, assumed: uncertainty.pitchRad === null, unsure: { ...CERTAIN, tiltRad: tilt } },
    { key: 'field', name: 'the field of view', words: `±${plainMm(degrees(field), 2)}° of view`, assumed: uncertainty.hfovRad === null, unsure: { ...CERTAIN, hfovRad: field } },
    { key: 'viewer', name: 'the size of the viewer', words: `±${plainMm(viewer * 100)} % of distance`, assumed: isUsual(tuning), unsure: { ...CERTAIN, viewerScale: viewer } },
  ];
}

/** Nobody's own scale: what is taken for everyone. */
const isUsual = ({ ipdMm, scaleFactor }: WallSetUp['tuning']) =>
  ipdMm.value === usualTuning.ipdMm.value && ipdMm.uncertainty === usualTuning.ipdMm.uncertainty && scaleFactor === usualTuning.scaleFactor;

/** All of them at once. */
export const together = (sources: readonly Source[]): SetUpUncertainty =>
  sources.reduce<SetUpUncertainty>(
    (all, { unsure }) => ({
      hfovRad: all.hfovRad + unsure.hfovRad,
      tiltRad: all.tiltRad + unsure.tiltRad,
      positionMm: all.positionMm + unsure.positionMm,
      viewerScale: all.viewerScale + unsure.viewerScale,
      glassScale: all.glassScale + unsure.glassScale,
    }),
    CERTAIN,
  );

/** mm on the glass for each example depth, seen from the middle of the zone; null where the camera does not see it or the set-up is impossible. */
export function errorsOf({ glass, camera, zone }: WallSetUp, unsure: SetUpUncertainty): number[] | null {
  try {
    return exampleDepths.map((depthMm) => glassErrorMm(glass, cameraOf(camera), unsure, depthMm, middleOf(zone)));
  } catch (cause) {
    if (cause instanceof GeometryError) return null;
    throw cause;
  }
}

/** In which step of the set-up each figure is measured. */
const measuredIn: Readonly<Record<Source['key'], string>> = { glass: 'Glass', position: 'Camera', tilt: 'Camera', field: 'Camera', viewer: 'Viewer' };

/** Of what nobody measured, that which counts most on the glass, and where it is measured; empty where all is measured, or the camera sees nothing. */
export function worthMeasuring(setUp: WallSetUp): string {
  const assumed = sourcesOf(setUp).filter((source) => source.assumed);
  const counted = assumed.map((source) => ({ source, far: errorsOf(setUp, source.unsure)?.at(-1) ?? 0 }));
  const most = counted.reduce((a, b) => (b.far > a.far ? b : a), { source: null as Source | null, far: 0 }).source;
  return most ? `What is only assumed and counts most is ${most.name}: measure it in the step ${measuredIn[most.key]}.` : '';
}

/** A length on the glass: to a tenth of a mm, below that to a hundredth. */
export const sayError = (mm: number): string => mm.toFixed(mm < 0.095 ? 2 : 1);

/** "±0.4 mm on the glass for a layer 100 mm behind, ±1.7 mm for one 500 mm behind"; empty where the camera sees nothing. */
function onGlass(setUp: WallSetUp, unsure: SetUpUncertainty): string {
  const [near, far] = errorsOf(setUp, unsure)?.map(sayError) ?? [];
  return near ? `±${near} mm on the glass for a layer ${exampleDepths[0]} mm behind, ±${far} mm for one ${exampleDepths[1]} mm behind` : '';
}

/** What a measurement is worth before it is taken: "On the glass that is ±0.4 mm for a layer 100 mm behind …". */
export function worthWords(setUp: WallSetUp, unsure: Partial<SetUpUncertainty>): string {
  const words = onGlass(setUp, { ...CERTAIN, ...unsure });
  return words && `That is ${words}.`;
}

/** "±2.1° of view: ±0.4 mm on the glass for a layer 100 mm behind, ±1.7 mm for one 500 mm behind." */
export function meansWords(setUp: WallSetUp, { words, unsure, assumed }: Source): string {
  const means = onGlass(setUp, unsure);
  if (!means) return 'The camera does not see the middle of the viewing zone: turn it there, or move the zone.';
  return assumed ? `Not measured. Taken as ${words}: ${means}.` : `${words}: ${means}.`;
}
