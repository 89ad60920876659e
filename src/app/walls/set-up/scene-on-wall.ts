import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { clearPart } from '@oriel/shared/projection/clear-part';
import { retarget, scaleZone } from '@oriel/shared/projection/retarget';
import type { ViewingZone } from '@oriel/shared/projection/types';
import { type StatedFault, statedFaults } from '../../drawing/stated-faults';
import { describeChange, describeZone } from '../wall-words';

/** A layer that is not clear from the wall's viewing zone, and the worst that is seen of it. */
export interface ShowingLayer {
  readonly name: string;
  readonly worst: string;
}

/** What a chosen scene becomes on a wall, in words. */
export interface SceneOnWall {
  /** How it is scaled, and what its zone then is. */
  readonly scaled: string;
  /** Whether no edge shows from anywhere in the wall's viewing zone. */
  readonly clear: boolean;
  readonly verdict: string;
  readonly layers: readonly ShowingLayer[];
  /** The part of the wall's zone from which it is clear, which settles it; null where it is clear from all of it, or from nowhere worth keeping. */
  readonly offer: { readonly zone: ViewingZone; readonly words: string } | null;
  /** What else a person can do; none where it is clear. */
  readonly remedies: readonly string[];
}

/** Shapes that differ by less than this are one: a screen's own rounding. */
const sameShape = 0.02;

/** Nobody looks around in a picture from less: two steps across, and one deep, mm. Practice. */
const leastZone = { acrossMm: 300, deepMm: 300 } as const;

/** Whether no edge of a scene would show on a wall from anywhere in its viewing zone. */
export const isClearOnWall = (document: SceneDocument, { glass, zone }: Pick<WallSetUp, 'glass' | 'zone'>): boolean =>
  statedFaults({ ...document, ...retarget(document, glass), zone }).length === 0;

/** Judges a scene as it is carried to a wall's glass, over the wall's own viewing zone. */
export function sceneOnWall(document: SceneDocument, { glass, zone }: Pick<WallSetUp, 'glass' | 'zone'>): SceneOnWall {
  const carried = retarget(document, glass);
  const faults = statedFaults({ ...document, ...carried, zone });
  const layers = layersOf(document, faults);
  const elsewhere = faults.filter(({ layerId }) => layerId === null).map(({ words }) => words);
  const scaled = `Composed for a glass ${Math.round(document.glass.widthMm)} mm wide, it is scaled here by ${carried.factor.toFixed(2)}: layers, depths and its viewing zone, which is then ${describeZone(carried.zone)}.${shapeWords(document, glass)}`;
  if (faults.length === 0) return { scaled, clear: true, verdict: 'Clear from everywhere in this wall’s viewing zone: no edge shows.', layers, offer: null, remedies: [] };
  return {
    scaled,
    clear: false,
    verdict: ['Not clear from all of this wall’s viewing zone.', layers.length > 0 ? `An edge would show of ${listed(layers.map(({ name }) => name))}.` : '', ...elsewhere.map((words) => `${words.replace(/\.$/, '')}.`)].filter(Boolean).join(' '),
    layers,
    offer: offerOf({ ...document, ...carried }, zone),
    remedies: [
      `To follow everywhere, make the scene’s zone wider in the composer, ${describeZone(scaleZone(zone, 1 / carried.factor))} there, and enlarge the layers until its title block says clear.`,
    ],
  };
}

function offerOf(carried: SceneDocument, zone: ViewingZone): SceneOnWall['offer'] {
  const part = clearPart({ ...carried, layers: carried.layers.filter(({ shown }) => shown) }, zone);
  if (!part || part.rightMm - part.leftMm < leastZone.acrossMm || part.farthestMm - part.nearestMm < leastZone.deepMm) return null;
  if (statedFaults({ ...carried, zone: part }).length > 0) return null;
  return { zone: part, words: describeChange(zone, part) };
}

function shapeWords({ glass: composed }: SceneDocument, glass: WallSetUp['glass']): string {
  const shape = (glass.widthMm / glass.heightMm) * (composed.heightMm / composed.widthMm);
  if (Math.abs(shape - 1) <= sameShape) return '';
  return ` It has another shape than this glass: it is shown whole, with a dark strip ${shape > 1 ? 'left and right' : 'above and below'}.`;
}

/** Each layer once, with the first of its faults that are worst put. */
function layersOf({ layers }: SceneDocument, faults: readonly StatedFault[]): ShowingLayer[] {
  return layers.flatMap(({ id, name }) => {
    const own = faults.filter(({ layerId }) => layerId === id);
    if (own.length === 0) return [];
    const worst = own.reduce((a, b) => (b.shortMm > a.shortMm ? b : a));
    const rest = worst.words.slice(name.length).replace(/^[:,]\s*/, '');
    return [{ name, worst: `${rest}${worst.from ? `, seen ${worst.from}` : ''}` }];
  });
}

const listed = (names: readonly string[]) => (names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`);
