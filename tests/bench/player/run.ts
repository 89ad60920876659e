import { cpus, totalmem } from 'node:os';
import { COMPUTERS } from './computers';
import { changeScenes, type LeakResult } from './leak';
import { measure, type Measured } from './measure';
import { readOptions, type Condition } from './options';
import { whyNoQuota } from './quota';
import { Stand } from './stand';
import { conditionWords, tableHead, tableLine } from './table';

const say = (words: string): void => console.log(words);

type Result = Condition & (Measured | { readonly failure: string });

async function main(): Promise<void> {
  const { conditions, seconds, settleSeconds, changes, trace } = readOptions(process.argv.slice(2));
  const why = whyNoQuota();
  const possible = why === null ? conditions : conditions.filter(({ computer }) => COMPUTERS[computer].inAll === null);
  if (possible.length < conditions.length) say(`No smaller computer is emulated, for ${String(why)}: measured unthrottled only.`);
  const machine = { processor: cpus()[0].model, cores: cpus().length, memoryGB: Math.round(totalmem() / 1e9) };
  say(`On ${String(machine.cores)} cores of ${machine.processor}; css composites in software, three draws by SwiftShader; no graphics processor is used.`);
  const stand = await Stand.build(say);
  const results: Result[] = [];
  const leaks: LeakResult[] = [];
  let goesOn = true;
  for (const signal of ['SIGINT', 'SIGTERM'] as const)
    process.once(signal, () => {
      goesOn = false;
      void stand.breakOff();
    });
  try {
    if (possible.length > 0) say(tableHead());
    for (const condition of possible) if (goesOn) results.push(await one(stand, condition, settleSeconds, seconds, trace));
    for (const renderer of goesOn && changes > 0 ? (['css', 'three'] as const) : []) leaks.push(await changeScenes(stand, renderer, changes, say));
  } finally {
    await stand.end();
  }
  say(JSON.stringify({ machine, seconds, settleSeconds, conditions: results.map(shorn), leaks }));
  if (results.some((result) => 'failure' in result)) process.exitCode = 1;
}

async function one(stand: Stand, condition: Condition, settleSeconds: number, seconds: number, trace: boolean): Promise<Result> {
  try {
    const measured = await measure(stand, condition, settleSeconds, seconds);
    say(tableLine(condition, measured));
    for (const { atS, from, to, reason } of measured.ladder) say(`    at ${atS.toFixed(0)} s from step ${String(from)} to ${String(to)}: ${reason}`);
    for (const { atS, toPerS, reason } of measured.drawingRates) say(`    at ${atS.toFixed(0)} s drawn ${toPerS === null ? 'at every refresh' : `at most ${String(toPerS)} times a second`}: ${reason}`);
    if (trace) {
      say(`    processors by kind: ${JSON.stringify(measured.processorBy)}; ready after ${String(measured.readyS)} s`);
      say(`    frames, faces, look ms, step, second by second: ${measured.seconds.map((second) => second.join(' ')).join(' | ')}`);
    }
    return { ...condition, ...measured };
  } catch (error) {
    const failure = error instanceof Error ? error.message.split('\n')[0] : String(error);
    say(`${conditionWords(condition)}: ${failure}`);
    return { ...condition, failure };
  }
}

/** Without what is printed on request only. */
const shorn = (result: Result): object => Object.fromEntries(Object.entries(result).filter(([name]) => name !== 'seconds'));

main().catch((cause: unknown) => {
  console.error(cause instanceof Error ? cause.message : cause);
  process.exitCode = 1;
});
