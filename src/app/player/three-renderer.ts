import {
  Camera, CustomBlending, LinearFilter, LinearMipmapLinearFilter, LinearSRGBColorSpace, Mesh, NoColorSpace, OneFactor, OneMinusSrcAlphaFactor,
  PlaneGeometry, Scene, ShaderMaterial, Texture, WebGLRenderer,
} from 'three';
import { writeOffAxisMatrix } from '@oriel/shared/projection/frustum';
import type { DerivativeEdge } from '@oriel/shared/contracts/photos';
import type { Point3 } from '@oriel/shared/projection/types';
import { mippedBytes, pixelBytes } from './graphics-bytes';
import { LayerPictures, type PictureShelf } from './layer-pictures';
import type { LoadOutcome, PictureAddress, Renderer, RendererFacts } from './renderer';
import type { SceneOnScreen, Stage } from './scene-on-screen';

const vertexShader = 'varying vec2 at; void main() { at = uv; gl_Position = projectionMatrix * modelViewMatrix * vec4(position, 1.0); }';
const fragmentShader = 'uniform sampler2D picture; uniform float opacity; varying vec2 at; void main() { gl_FragColor = texture2D(picture, at) * opacity; }';

interface DrawnLayer {
  readonly mesh: Mesh<PlaneGeometry, ShaderMaterial>;
  texture: Texture | null;
}

/**
 * Draws layers as textured planes at their true places in millimetres, through the off-axis frustum of the eye. Pictures are premultiplied
 * and stay encoded in sRGB from texture to screen, so that colours are the file's own and edges blend as the browser blends them.
 * One WebGL context, one geometry and one material serve every scene loaded.
 */
export class ThreeRenderer implements Renderer, PictureShelf<ImageBitmap> {
  readonly greatestPx: number;
  private readonly gl: WebGLRenderer;
  private readonly scene = new Scene();
  private readonly camera = new Camera();
  private readonly plane = new PlaneGeometry(1, 1);
  private readonly material = new ShaderMaterial({
    vertexShader, fragmentShader,
    uniforms: { picture: { value: null }, opacity: { value: 1 } },
    transparent: true, depthTest: false, depthWrite: false,
    blending: CustomBlending, blendSrc: OneFactor, blendDst: OneMinusSrcAlphaFactor,
  });
  private readonly eye = { x: 0, y: 0, z: 1 };
  private drawn: DrawnLayer[] = [];
  private stage: Stage | null = null;
  private nearestDepthMm = 0;
  private farthestDepthMm = 0;
  private pictures: LayerPictures<ImageBitmap> | null = null;

  /** `lost` is called when the graphics processor takes its context away: another renderer must then go on. @throws Error without WebGL. */
  constructor(
    host: HTMLElement,
    private readonly addressOf: PictureAddress,
    private readonly lost: () => void,
  ) {
    this.gl = new WebGLRenderer({ antialias: true, alpha: false, depth: false, stencil: false, powerPreference: 'high-performance' });
    this.gl.outputColorSpace = LinearSRGBColorSpace;
    this.gl.domElement.style.position = 'absolute';
    this.gl.domElement.addEventListener('webglcontextlost', this.lost);
    this.greatestPx = this.gl.capabilities.maxTextureSize;
    this.camera.matrixAutoUpdate = false;
    host.append(this.gl.domElement);
  }

  get facts(): RendererFacts {
    const { textures, geometries } = this.gl.info.memory;
    return {
      name: 'three',
      layers: this.drawn.length,
      pictureBytes: this.pictures?.bytes(pixelBytes) ?? 0,
      graphicsBytes: (this.pictures?.bytes(mippedBytes) ?? 0) + this.drawnIntoBytes(),
      held: textures + geometries + (this.gl.domElement.isConnected ? 1 : 0),
      sharp: this.pictures?.sharp ?? false,
    };
  }

  async load(scene: SceneOnScreen): Promise<LoadOutcome> {
    this.clear();
    this.gl.domElement.style.visibility = 'hidden';
    this.drawn = scene.layers.map(({ opacity }, order) => this.addMesh(opacity, order));
    const pictures = (this.pictures = new LayerPictures(scene.layers, this));
    this.fit(scene);
    this.draw(scene.homeEye);
    const missing = await pictures.loadFirst();
    this.gl.domElement.style.visibility = '';
    pictures.sharpen();
    return { missing };
  }

  resize(scene: SceneOnScreen): void {
    this.fit(scene);
    this.draw(this.eye);
    this.pictures?.sharpen(scene.layers);
  }

  draw(eye: Point3): void {
    if (!this.stage) return;
    this.eye.x = eye.x;
    this.eye.y = eye.y;
    this.eye.z = eye.z;
    const near = (eye.z + this.nearestDepthMm) / 2;
    const far = (eye.z + this.farthestDepthMm) * 2;
    writeOffAxisMatrix(this.stage.glass, eye, near, far, this.camera.projectionMatrix.elements);
    this.camera.matrix.makeTranslation(eye.x, eye.y, eye.z);
    this.camera.matrixWorldNeedsUpdate = true;
    this.gl.render(this.scene, this.camera);
  }

  dispose(): void {
    this.clear();
    this.plane.dispose();
    this.material.dispose();
    this.gl.domElement.removeEventListener('webglcontextlost', this.lost);
    this.gl.dispose();
    this.gl.forceContextLoss();
    this.gl.domElement.remove();
  }

  async fetch(imageId: string, edge: DerivativeEdge, signal: AbortSignal): Promise<ImageBitmap> {
    const reply = await fetch(this.addressOf(imageId, edge), { signal });
    if (!reply.ok) throw new Error(`The picture answered ${reply.status}`);
    return createImageBitmap(await reply.blob(), { imageOrientation: 'flipY', premultiplyAlpha: 'premultiply' });
  }

  put(index: number, bitmap: ImageBitmap): void {
    const texture = new Texture(bitmap);
    texture.flipY = false;
    texture.colorSpace = NoColorSpace;
    texture.minFilter = LinearMipmapLinearFilter;
    texture.magFilter = LinearFilter;
    texture.anisotropy = Math.min(4, this.gl.capabilities.getMaxAnisotropy());
    texture.needsUpdate = true;
    this.gl.initTexture(texture);
    bitmap.close();
    const drawn = this.drawn[index];
    drawn.texture?.dispose();
    drawn.texture = texture;
    drawn.mesh.visible = true;
    this.draw(this.eye);
  }

  discard(bitmap: ImageBitmap): void {
    bitmap.close();
  }

  /** All meshes share the material: each sets its own picture just before it is drawn. */
  private addMesh(opacity: number, order: number): DrawnLayer {
    const mesh = new Mesh(this.plane, this.material);
    const drawn: DrawnLayer = { mesh, texture: null };
    mesh.visible = false;
    mesh.frustumCulled = false;
    mesh.matrixAutoUpdate = false;
    mesh.renderOrder = order;
    mesh.onBeforeRender = () => {
      this.material.uniforms['picture'].value = drawn.texture;
      this.material.uniforms['opacity'].value = opacity;
      this.material.uniformsNeedUpdate = true;
    };
    this.scene.add(mesh);
    return drawn;
  }

  private fit({ stage, layers }: SceneOnScreen): void {
    this.stage = stage;
    this.nearestDepthMm = Math.min(0, ...layers.map((layer) => layer.depthMm));
    this.farthestDepthMm = Math.max(0, ...layers.map((layer) => layer.depthMm));
    this.gl.setPixelRatio(stage.deviceRatio);
    this.gl.setSize(stage.widthPx, stage.heightPx);
    this.gl.domElement.style.left = `${stage.leftPx}px`;
    this.gl.domElement.style.top = `${stage.topPx}px`;
    this.drawn.forEach(({ mesh }, index) => {
      const { plane, depthMm } = layers[index];
      mesh.scale.set(plane.widthMm, plane.heightMm, 1);
      mesh.position.set(plane.xMm, plane.yMm, -depthMm);
      mesh.updateMatrix();
    });
  }

  /** What is drawn into: a colour buffer of several samples a pixel, and the one it is resolved to and shown from. */
  private drawnIntoBytes(): number {
    const gl = this.gl.getContext();
    const samples = Number(gl.getParameter(gl.SAMPLES)) || 0;
    return (samples + 2) * pixelBytes(gl.drawingBufferWidth, gl.drawingBufferHeight);
  }

  private clear(): void {
    this.pictures?.stop();
    this.pictures = null;
    for (const { texture } of this.drawn) texture?.dispose();
    this.scene.clear();
    this.drawn = [];
    this.material.uniforms['picture'].value = null;
  }
}
