/**
 * Thrown when a figure cannot describe a real glass, eye, layer or camera. `value` names the offending figure as it is
 * written in the data ('eye.z', 'depthMm', 'glass.widthMm'), so that a form can point at the right field.
 */
export class GeometryError extends Error {
  override readonly name = 'GeometryError';

  constructor(
    readonly value: string,
    message: string,
  ) {
    super(message);
  }
}
