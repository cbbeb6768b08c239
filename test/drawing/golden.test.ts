/**
 * These pictures have not drifted: each was looked at, at phone size, before it was kept.
 * `UPDATE_PICTURES=1` writes them anew; look at each before it is committed.
 */
import { readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { PNG } from 'pngjs';
import { expect, test } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import { recordPictures } from '../../commands/knurl/recordPictures.ts';
import { sketchesOf } from '../../src/adapters/common/draw.ts';
import { openDesk, plainShop } from '../../src/desk/index.ts';
import { openRenderer } from '../../src/drawing/index.ts';
import { en } from '../../src/phrases/index.ts';
import { called } from './called.ts';
import { RECORD_PARTS } from './recordParts.ts';
import { spokenIn, svgOf } from './setups.ts';

/** A phone held upright. */
const PHONE = 400;
/** Difference of one colour of a dot, of 255, that the edges of letters may have between machines. Judgement. */
const SAME_DOT = 48;
/** Share of the dots that may differ by more. Judgement. */
const DRIFT = 0.002;

const PICTURES = [
  ['tooth form in inches', 'in', '/knurl 1.000 straight 21tpi 1018', 'toothForm'],
  ['tooth form of very round work', 'mm', '/knurl 4.2mm straight 3.2 pitch brass', 'toothForm'],
  [
    'strip of a bar that has to be turned',
    'mm',
    '/knurl 19mm diamond 1.0 pitch 304',
    'trackingStrip',
  ],
  [
    'strip that is broken',
    'in',
    '/knurl 1.500 straight 21tpi 1018 finish 0.995-1.005',
    'trackingStrip',
  ],
  [
    'sketch of a travelling wheel',
    'mm',
    '/knurl 19mm diamond 1.0 pitch 304 long 30mm out 60mm',
    'setupSketch',
  ],
  [
    'sketch with its scale broken',
    'mm',
    '/knurl 480mm straight 0.2 pitch brass long 100mm out 200mm opposed',
    'setupSketch',
  ],
  ['pattern that splits', 'in', '/knurl 1.000 diamond 21tpi brass as-is', 'developedPattern'],
  ['plan map', 'in', '/knurl plan finish 0.995-1.005 straight 96dp 303 long 0.5', 'planMap'],
] as const;

const render = openRenderer();

const pngOf = async (svg: string): Promise<PNG> =>
  PNG.sync.read(Buffer.from(await render(svg, PHONE)));

const drawnFor = async (units: 'in' | 'mm', words: string, kind: string): Promise<PNG> => {
  const answer = await openDesk(FLEET, plainShop(units)).answer(called(words));
  const sketch = sketchesOf(answer, en).find(({ name }) => name.endsWith(kind));
  if (sketch === undefined) throw new Error(`${words} shows no ${kind}`);
  return await pngOf(sketch.svg);
};

const shareOff = (a: PNG, b: PNG): number => {
  let off = 0;
  for (let i = 0; i < a.data.length; i += 4) {
    const differs = [0, 1, 2, 3].some(
      (c) => Math.abs((a.data[i + c] ?? 0) - (b.data[i + c] ?? 0)) > SAME_DOT,
    );
    if (differs) off += 1;
  }
  return off / (a.data.length / 4);
};

const fileOf = (name: string): string =>
  fileURLToPath(new URL(`golden/${name.replaceAll(' ', '-')}.png`, import.meta.url));

const looksAsItDid = (name: string, drawn: PNG): void => {
  if (process.env['UPDATE_PICTURES'] === '1') writeFileSync(fileOf(name), PNG.sync.write(drawn));
  const kept = PNG.sync.read(readFileSync(fileOf(name)));
  expect([drawn.width, drawn.height]).toEqual([kept.width, kept.height]);
  expect(shareOff(drawn, kept)).toBeLessThanOrEqual(DRIFT);
};

test.each(PICTURES)('%s looks as it did', async (name, units, words, kind) => {
  looksAsItDid(name, await drawnFor(units, words, kind));
});

test('record of a shop looks as it did', async () => {
  const [spoken] = spokenIn('mm', recordPictures(RECORD_PARTS));
  if (spoken === undefined) throw new Error('no record is drawn');
  looksAsItDid('record of a shop', await pngOf(svgOf(spoken)));
});

test('a mark that moved by a few dots is seen', async () => {
  const [, units, words, kind] = PICTURES[2];
  const drawn = await drawnFor(units, words, kind);
  const moved = PNG.sync.read(PNG.sync.write(drawn));
  PNG.bitblt(drawn, moved, 20, 40, 360, 80, 23, 40);
  expect(shareOff(drawn, moved)).toBeGreaterThan(DRIFT);
});
