import { drawsInSoftware, rendererFor } from './choose-renderer';

describe('the choice of a renderer', () => {
  it.each([
    'ANGLE (Google, Vulkan 1.3.0 (SwiftShader Device (Subzero) (0x0000C0DE)), SwiftShader driver)',
    'llvmpipe (LLVM 15.0.6, 256 bits)',
    'Apple Software Renderer',
    'ANGLE (Microsoft, Microsoft Basic Render Driver Direct3D11 vs_5_0 ps_5_0)',
  ])('takes CSS where the processor draws: %s', (name) => {
    expect(drawsInSoftware(name)).toBe(true);
    expect(rendererFor(undefined, name)).toBe('css');
  });

  it.each(['ANGLE (Intel, Mesa Intel(R) UHD Graphics 620 (KBL GT2), OpenGL 4.6)', 'Apple M1', 'Adreno (TM) 640', 'V3D 7.1', 'Mali-G31'])(
    'takes three where there is a graphics processor: %s',
    (name) => expect(rendererFor(undefined, name)).toBe('three'),
  );

  it('takes CSS without WebGL, and what the query asks for whatever there is', () => {
    expect(rendererFor(undefined, null)).toBe('css');
    expect(rendererFor('three', null)).toBe('three');
    expect(rendererFor('css', 'Apple M1')).toBe('css');
    expect(rendererFor('something', 'Apple M1')).toBe('three');
  });
});
