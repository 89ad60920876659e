import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';

const module = fileURLToPath(new URL('./open-log.ts', import.meta.url));

const start = (lines: string) =>
  spawn(process.execPath, ['--import', 'tsx', '--input-type=module', '-e', `const { openLog } = await import(${JSON.stringify(module)}); const log = openLog('info'); ${lines}`], {
    stdio: ['pipe', 'pipe', 'ignore'],
  });

describe('the log', () => {
  it('has every line out before the process exits', async () => {
    const child = start("for (let i = 0; i < 3; i++) log.info(`line ${i}`); process.exit(0);");
    let seen = '';
    child.stdout.on('data', (chunk: Buffer) => (seen += chunk.toString()));
    await once(child, 'close');
    expect(seen.match(/"msg":"line \d"/g)).toEqual(['"msg":"line 0"', '"msg":"line 1"', '"msg":"line 2"']);
  });

  it('does not keep the process from exiting where nobody reads it any more', async () => {
    const child = start("await new Promise((go) => process.stdin.once('data', go)); log.info('to nobody'); log.info('at all'); process.exit(3);");
    child.stdout.destroy();
    child.stdin.write('now\n');
    const timer = setTimeout(() => child.kill('SIGKILL'), 15_000);
    const [code] = (await once(child, 'exit')) as [number | null];
    clearTimeout(timer);
    expect(code).toBe(3);
  }, 20_000);
});
