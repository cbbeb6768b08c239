/**
 * What a picture costs: time and memory of one, and how far the event loop falls behind while
 * 50 are asked for at once.
 */
import { monitorEventLoopDelay } from 'node:perf_hooks';
import { setTimeout as pause } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';
import { FLEET } from '../../commands/index.ts';
import { sketchesOf } from '../../src/adapters/common/draw.ts';
import { openDesk, plainShop } from '../../src/desk/index.ts';
import { openRenderer } from '../../src/drawing/index.ts';
import { en } from '../../src/phrases/index.ts';
import { called } from '../drawing/called.ts';

/** What the job asks for: an answer has three seconds, and a picture may take none of them. */
export const MOST_DELAY_MS = 20;
const AT_ONCE = 50;

const svgs = async (count: number): Promise<readonly string[]> => {
  const desk = openDesk(FLEET, plainShop('mm'));
  const drawn = await Promise.all(
    Array.from({ length: count }, async (_, i) => {
      const size = (15 + i * 0.1).toFixed(1);
      const answer = await desk.answer(called(`/knurl ${size}mm straight 1.0 pitch 1018`));
      return sketchesOf(answer, en)[0]?.svg ?? '';
    }),
  );
  return drawn.filter((svg) => svg !== '');
};

const RESOLUTION_MS = 1;

/** How far the event loop falls behind at the 99th percentile while something is done. */
const delayWhile = async (work: () => Promise<unknown>): Promise<number> => {
  const loop = monitorEventLoopDelay({ resolution: RESOLUTION_MS });
  loop.enable();
  await work();
  loop.disable();
  return Math.max(0, loop.percentile(99) / 1e6 - RESOLUTION_MS);
};

export type PictureCost = {
  readonly pictures: number;
  readonly drawMs: number;
  readonly oneMs: number;
  readonly kilobytes: number;
  readonly allMs: number;
  readonly memoryMb: number;
  /** Of the event loop while all were made, beside what the timer itself takes. */
  readonly delay99Ms: number;
  /** The same for as long again with nothing to do: what the machine is busy with besides. */
  readonly idle99Ms: number;
};

export const benchPictures = async (): Promise<PictureCost> => {
  const started = performance.now();
  const list = await svgs(AT_ONCE + 1);
  const drawMs = (performance.now() - started) / list.length;
  const render = openRenderer();
  const [first = '', ...others] = list;
  const one = performance.now();
  const { length } = await render(first);
  const oneMs = performance.now() - one;
  const before = process.memoryUsage().rss;
  const all = performance.now();
  const delay99Ms = await delayWhile(() => Promise.all(others.map((svg) => render(svg))));
  const allMs = performance.now() - all;
  const memoryMb = (process.memoryUsage().rss - before) / 2 ** 20;
  const idle99Ms = await delayWhile(() => pause(allMs));
  return {
    pictures: others.length,
    drawMs,
    oneMs,
    kilobytes: length / 1024,
    allMs,
    memoryMb,
    delay99Ms,
    idle99Ms,
  };
};

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const cost = await benchPictures();
  for (const [what, value] of Object.entries(cost))
    process.stdout.write(`${what.padEnd(12)} ${value.toFixed(1)}\n`);
  process.exitCode = cost.delay99Ms > MOST_DELAY_MS ? 1 : 0;
}
