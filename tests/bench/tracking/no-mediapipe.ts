/** Stands in for the reference's other runtime, which is never chosen here and must not be loaded. */
export class FaceMesh {}
export class FaceDetection {}
export const FACE_GEOMETRY = undefined;
