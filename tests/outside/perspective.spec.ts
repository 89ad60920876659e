import fc from 'fast-check';
import { Matrix4, PerspectiveCamera, Vector3, WebGLCoordinateSystem } from 'three';
import { describe, expect, it } from 'vitest';
import { writeOffAxisMatrix } from '@oriel/shared/projection/frustum';
import { project } from '@oriel/shared/projection/layer-on-glass';
import { anyEye, anyGlass, figure } from '@oriel/shared/projection/testing/arbitraries';
import type { Glass, Point3 } from '@oriel/shared/projection/types';
import { frameCorners } from 'three/addons/utils/CameraUtils.js';

function matrixOf(glass: Glass, eye: Point3, near: number, far: number): number[] {
  const out = new Array<number>(16).fill(NaN);
  writeOffAxisMatrix(glass, eye, near, far, out);
  return out;
}

/** three's own matrix for the edges of the glass carried to the near plane (R. Kooima, Generalized Perspective Projection, 2009). */
function threesMatrix({ widthMm, heightMm }: Glass, eye: Point3, near: number, far: number): Matrix4 {
  const onNear = (edgeMm: number, eyeMm: number) => ((edgeMm - eyeMm) * near) / eye.z;
  const [left, right] = [onNear(-widthMm / 2, eye.x), onNear(widthMm / 2, eye.x)];
  const [top, bottom] = [onNear(heightMm / 2, eye.y), onNear(-heightMm / 2, eye.y)];
  return new Matrix4().makePerspective(left, right, top, bottom, near, far, WebGLCoordinateSystem);
}

/** Reference: three's Matrix4, PerspectiveCamera and CameraUtils.frameCorners (Kooima's generalised projection). */
describe('writeOffAxisMatrix beside three', () => {
  it('is Matrix4.makePerspective, number by number', () => {
    fc.assert(
      fc.property(anyGlass, anyEye, figure(1, 100), figure(200, 50_000), (glass, eye, near, far) => {
        const reference = threesMatrix(glass, eye, near, far);
        matrixOf(glass, eye, near, far).forEach((entry, i) => expect(entry).toBeCloseTo(reference.elements[i], 9));
      }),
    );
  });

  it('is PerspectiveCamera(75, 16/9, 0.1, 300) for the glass that camera sees (its diagonal read)', () => {
    const heightMm = 2 * Math.tan((75 * Math.PI) / 360);
    const glass = { widthMm: (heightMm * 16) / 9, heightMm };
    const matrix = matrixOf(glass, { x: 0, y: 0, z: 1 }, 0.1, 300);
    [0.7330642938613892, 1.3032253980636597, -1.000666856765747].forEach((entry, i) =>
      expect(matrix[5 * i]).toBeCloseTo(entry, 6),
    );
    expect(matrix[14]).toBeCloseTo(-0.2000666856765747, 6);
    const camera = new PerspectiveCamera(75, 16 / 9, 0.1, 300);
    camera.projectionMatrix.elements.forEach((entry, i) => expect(matrix[i]).toBeCloseTo(entry, 12));
  });

  it('agrees with Kooima’s frameCorners on the corners of the glass', () => {
    fc.assert(
      fc.property(anyGlass, anyEye, (glass, eye) => {
        const camera = new PerspectiveCamera(50, 1, 10, 5000);
        camera.position.set(eye.x, eye.y, eye.z);
        const [w, h] = [glass.widthMm / 2, glass.heightMm / 2];
        frameCorners(camera, new Vector3(-w, -h, 0), new Vector3(w, -h, 0), new Vector3(-w, h, 0));
        const matrix = matrixOf(glass, eye, 10, 5000);
        camera.projectionMatrix.elements.forEach((entry, i) => expect(matrix[i]).toBeCloseTo(entry, 6));
      }),
    );
  });
});

describe('project beside three', () => {
  it('sees a point where a camera at the eye with the off-axis matrix draws it', () => {
    fc.assert(
      fc.property(
        anyGlass,
        anyEye,
        figure(-2000, 2000),
        figure(-2000, 2000),
        figure(-4000, 150),
        (glass, eye, x, y, z) => {
          const camera = new PerspectiveCamera();
          camera.position.set(eye.x, eye.y, eye.z);
          camera.updateMatrixWorld();
          camera.projectionMatrix.copy(threesMatrix(glass, eye, 10, 20_000));
          const drawn = new Vector3(x, y, z)
            .applyMatrix4(camera.matrixWorldInverse)
            .applyMatrix4(camera.projectionMatrix);
          const seen = project({ x, y, z }, eye);
          expect((drawn.x * glass.widthMm) / 2).toBeCloseTo(seen.x, 6);
          expect((drawn.y * glass.heightMm) / 2).toBeCloseTo(seen.y, 6);
        },
      ),
    );
  });
});
