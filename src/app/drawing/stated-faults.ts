import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import { clearance, type Fault } from '@oriel/shared/projection/clearance';
import { GeometryError } from '@oriel/shared/projection/geometry-error';
import type { Point3 } from '@oriel/shared/projection/types';
import { describeEye, plainMm } from '../figures/words';

/** Why a scene is not clear, in words, with the layer and the eye that show it. */
export interface StatedFault {
  readonly words: string;
  /** From where it is seen, in words; empty where from everywhere. */
  readonly from: string;
  readonly layerId: string | null;
  /** By how much, mm; 0 where it has no measure. */
  readonly shortMm: number;
  readonly eye: Point3 | null;
}

/** Every fault of what is shown of a scene; empty when no edge shows from anywhere in the viewing zone. */
export function statedFaults(document: SceneDocument): StatedFault[] {
  const shown = document.layers.filter((layer) => layer.shown);
  try {
    return clearance({ ...document, layers: shown }).map((fault) => state(fault, (index) => shown[index]));
  } catch (error) {
    if (error instanceof GeometryError) return [{ words: error.message, from: '', layerId: null, shortMm: 0, eye: null }];
    throw error;
  }
}

/** Whole millimetres, but never none. */
const shortness = (mm: number) => `${mm < 10 ? plainMm(Math.max(mm, 0.1)) : plainMm(mm, 0)} mm`;

const sideWords = { left: 'left', right: 'right', top: 'top', bottom: 'lower' } as const;

function state(fault: Fault, layerAt: (index: number) => { id: string; name: string }): StatedFault {
  switch (fault.kind) {
    case 'edgeShows': {
      const { id, name } = layerAt(fault.layer);
      const words = `${name}, ${sideWords[fault.side]} edge: ${shortness(fault.shortMm)} short`;
      return { words, from: `from ${describeEye(fault.eye)}`, layerId: id, shortMm: fault.shortMm, eye: fault.eye };
    }
    case 'tooNear': {
      const { id, name } = layerAt(fault.layer);
      return { words: `${name}: ${shortness(fault.shortMm)} too near the nearest eye`, from: '', layerId: id, shortMm: fault.shortMm, eye: fault.eye };
    }
    case 'sideOpen':
      return { words: `Nothing covers the ${sideWords[fault.side]} side of the glass`, from: '', layerId: null, shortMm: 0, eye: null };
  }
}
