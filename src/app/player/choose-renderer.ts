import { CssRenderer } from './css-renderer';
import type { PictureAddress, Renderer, RendererName } from './renderer';

/** Names by which drivers that draw on the processor give themselves away (Chromium, Mesa, Windows, macOS). */
const softwareNames = /swiftshader|llvmpipe|softpipe|software|basic render|microsoft basic/i;

/** Whether a WebGL renderer's name says that the processor does its work. */
export function drawsInSoftware(graphicsName: string): boolean {
  return softwareNames.test(graphicsName);
}

/** What the browser calls its graphics processor; null where there is no WebGL 2. The context made to ask is given back. */
export function graphicsName(document: Document): string | null {
  const gl = document.createElement('canvas').getContext('webgl2');
  if (!gl) return null;
  const known = gl.getExtension('WEBGL_debug_renderer_info');
  const name: unknown = gl.getParameter(known ? known.UNMASKED_RENDERER_WEBGL : gl.RENDERER);
  gl.getExtension('WEBGL_lose_context')?.loseContext();
  return String(name);
}

/** `three` where there is a graphics processor, `css` where there is none; `asked` (the query `?draw=css|three`) overrides both. */
export function rendererFor(asked: string | undefined, name: string | null): RendererName {
  if (asked === 'css' || asked === 'three') return asked;
  return name === null || drawsInSoftware(name) ? 'css' : 'three';
}

/** Makes a renderer in `host`; three is fetched only where it is used, and where it fails to start css takes its place. */
export async function makeRenderer(name: RendererName, host: HTMLElement, addressOf: PictureAddress, lost: () => void): Promise<Renderer> {
  if (name === 'css') return new CssRenderer(host, addressOf);
  try {
    const { ThreeRenderer } = await import('./three-renderer');
    return new ThreeRenderer(host, addressOf, lost);
  } catch {
    return new CssRenderer(host, addressOf);
  }
}
