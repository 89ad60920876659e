import { describe, expect, it } from 'vitest';
import { neededOf } from './wall-files.mjs';

const statically = (path: string) => ({ path, kind: 'import-statement' });
const lazily = (path: string) => ({ path, kind: 'dynamic-import' });

describe('the scripts that a wall’s page may load', () => {
  const outputs = {
    'main.js': { entryPoint: 'src/main.ts', imports: [statically('core.js'), lazily('wall.js'), lazily('compose.js')] },
    'core.js': { imports: [] },
    'compose.js': { entryPoint: 'src/app/composer/composer.routes.ts', imports: [statically('core.js'), statically('sheet.js')] },
    'sheet.js': { imports: [] },
    'wall.js': { entryPoint: 'src/app/wall/wall.routes.ts', imports: [statically('core.js'), statically('player.js')] },
    'player.js': { imports: [lazily('three.js')] },
    'three.js': { imports: [] },
    'worker-AB12.js': { imports: [lazily('wasm.js')] },
    'worker-CD34.js': { imports: [] },
    'wasm.js': { imports: [] },
  };
  const texts: Record<string, string> = { 'player.js': 'new Worker(new URL("worker-AB12.js",import.meta.url))', 'sheet.js': '"worker-CD34.js"' };
  const textOf = (name: string) => texts[name] ?? '';

  it('are what everything begins with, its own, what that loads later, and its workers; nothing of other pages', () => {
    expect([...neededOf(outputs, textOf)].sort()).toEqual(['core.js', 'main.js', 'player.js', 'three.js', 'wall.js', 'wasm.js', 'worker-AB12.js']);
  });

  it('cannot be told of a build without the wall', () => {
    expect(() => neededOf({ ...outputs, 'wall.js': { imports: [] } }, textOf)).toThrow('src/app/wall/wall.routes.ts');
  });
});
