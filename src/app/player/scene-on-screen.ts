import type { LayerImage, SceneDocument } from '@oriel/shared/contracts/scenes';
import { EYE_MARGIN_MM } from '@oriel/shared/projection/clearance';
import { type EyeRoom, clearRoom } from '@oriel/shared/projection/eye-room';
import { planeFromHome } from '@oriel/shared/projection/home-plane';
import { layerScale } from '@oriel/shared/projection/layer-on-glass';
import { retarget } from '@oriel/shared/projection/retarget';
import type { Glass, Point2, Point3, Rectangle, ViewingZone } from '@oriel/shared/projection/types';
import type { WindowOnScreen } from './window-on-screen';

/** The part of the window that the scene fills, in whole CSS px; its centre is the origin of the scene. */
export interface Stage {
  readonly leftPx: number;
  readonly topPx: number;
  readonly widthPx: number;
  readonly heightPx: number;
  readonly pxPerMm: number;
  readonly deviceRatio: number;
  /** Its true size, and its centre from the centre of the screen, mm. */
  readonly glass: Glass;
  readonly centreMm: Point2;
}

/** A layer as the renderers need it. */
export interface LayerOnScreen {
  readonly name: string;
  readonly image: LayerImage;
  readonly opacity: number;
  readonly depthMm: number;
  /** Where it lies in its own plane, mm. */
  readonly plane: Rectangle;
  /** Size at which the home eye sees it, CSS px. */
  readonly homeWidthPx: number;
  readonly homeHeightPx: number;
  /** Its long edge where it is seen largest, in device px. */
  readonly largestPx: number;
}

/** A scene carried to this screen: everything a renderer is fed. */
export interface SceneOnScreen {
  readonly stage: Stage;
  readonly homeEye: Point3;
  readonly zone: ViewingZone;
  /** The eyes it is drawn for: from none of them does an edge show that is clear in the zone. */
  readonly room: EyeRoom;
  /** The eye must not come nearer than this, or it would pass a layer; mm. */
  readonly nearestEyeMm: number;
  /** Farthest first, as painters work; of equal depths the later in the ledger stands before the earlier. Hidden layers are left out. */
  readonly layers: readonly LayerOnScreen[];
}

/**
 * Carries a scene to the window's area of this screen. It is drawn for eyes of its own zone, scaled with the glass, and of the zone
 * measured for this room where it is clear from there. @throws GeometryError where the scene's figures are impossible.
 */
export function sceneOnScreen(document: SceneDocument, area: WindowOnScreen, roomZone?: ViewingZone): SceneOnScreen {
  const { pxPerMm } = area;
  const scene = retarget(document, { widthMm: area.widthPx / pxPerMm, heightMm: area.heightPx / pxPerMm });
  const shown = scene.layers.filter((layer) => layer.shown && layer.opacity > 0);
  const nearestEyeMm = Math.max(0, ...shown.map((layer) => -layer.depthMm)) + EYE_MARGIN_MM * Math.min(1, scene.factor);
  const farthest: Point3 = { x: 0, y: 0, z: Math.max(scene.zone.farthestMm, scene.homeEye.z, nearestEyeMm) };
  const nearest: Point3 = { x: 0, y: 0, z: Math.max(Math.min(scene.zone.nearestMm, scene.homeEye.z), nearestEyeMm) };
  return {
    stage: stageOf(scene.glass, area),
    homeEye: scene.homeEye,
    zone: scene.zone,
    room: clearRoom({ ...scene, layers: shown }, roomZone),
    nearestEyeMm,
    layers: shown
      .toSorted((a, b) => b.depthMm - a.depthMm)
      .map(({ name, image, opacity, depthMm, placed }) => {
        const plane = planeFromHome(placed, scene.homeEye, depthMm);
        const largest = Math.max(layerScale(nearest, depthMm), layerScale(farthest, depthMm));
        return {
          name, image, opacity, depthMm, plane,
          homeWidthPx: placed.widthMm * pxPerMm,
          homeHeightPx: placed.heightMm * pxPerMm,
          largestPx: Math.max(plane.widthMm, plane.heightMm) * largest * pxPerMm * area.deviceRatio,
        };
      }),
  };
}

/** Far less than a px: what reckoning with fractions may lose of a whole one. */
const roundingPx = 1e-6;

/**
 * Whole px, so that both renderers clip alike, and no more than the scene covers, so that no edge shows; what rounding moves the centre by
 * is in `centreMm`.
 */
function stageOf(fitted: Glass, area: WindowOnScreen): Stage {
  const { pxPerMm } = area;
  const widthPx = Math.max(1, Math.min(area.widthPx, Math.floor(fitted.widthMm * pxPerMm + roundingPx)));
  const heightPx = Math.max(1, Math.min(area.heightPx, Math.floor(fitted.heightMm * pxPerMm + roundingPx)));
  const leftPx = Math.floor((area.widthPx - widthPx) / 2);
  const topPx = Math.floor((area.heightPx - heightPx) / 2);
  return {
    leftPx, topPx, widthPx, heightPx, pxPerMm,
    deviceRatio: area.deviceRatio,
    glass: { widthMm: widthPx / pxPerMm, heightMm: heightPx / pxPerMm },
    centreMm: {
      x: area.centreMm.x + (leftPx + widthPx / 2 - area.widthPx / 2) / pxPerMm,
      y: area.centreMm.y - (topPx + heightPx / 2 - area.heightPx / 2) / pxPerMm,
    },
  };
}
