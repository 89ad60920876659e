/** Stands in for the reference's other runtime, which is never chosen here and must not be loaded. */
export const FaceMesh = undefined;
export const FaceDetection = undefined;
