/** Pictures on their way to people: Slack through its real client, the terminal, and when one fails. */
import { mkdtempSync, readdirSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PassThrough } from 'node:stream';
import { PNG } from 'pngjs';
import { expect, test } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import { openDraw, sketchesOf } from '../../src/adapters/common/draw.ts';
import { runChannel, writePictures } from '../../src/adapters/terminal/index.ts';
import { openDesk, plainShop } from '../../src/desk/index.ts';
import { openRenderer, PNG_WIDTH } from '../../src/drawing/index.ts';
import { en } from '../../src/phrases/index.ts';
import { openBot, readable, until } from '../adapters/slack/bot.ts';
import { called } from './called.ts';

const CARD = '1.000 straight 21tpi 1018';
const LINE = `/knurl ${CARD}`;
const desk = openDesk(FLEET, plainShop('in'));
const cannot = () => Promise.reject(new Error('no picture today'));

test('Slack gets every picture of a card after the card, each with its alt text', async () => {
  const faults: unknown[] = [];
  const draw = openDraw(en, openRenderer(), (error) => faults.push(error));
  const bot = await openBot({ draw });
  try {
    await bot.people.slash(CARD);
    await until(() => bot.platform.pictures.length === 3, 'three pictures');
    const alts = sketchesOf(await desk.answer(called(LINE)), en).map(({ alt }) => alt);
    expect(bot.platform.pictures.map(({ alt }) => alt)).toEqual(alts);
    expect(bot.platform.pictures.every(({ bytes }) => bytes > 5000)).toBe(true);
    expect(bot.platform.posted.length).toBeGreaterThan(0);
    expect([...faults, ...bot.faults, ...bot.platform.faults]).toEqual([]);
  } finally {
    await bot.stop();
  }
});

test('a picture that cannot be made is counted, and the card says that nothing else is missing', async () => {
  const faults: unknown[] = [];
  const bot = await openBot({ draw: openDraw(en, cannot, (error) => faults.push(error)) });
  const card = (): string => readable(bot.platform.posted[0]?.body ?? '');
  try {
    await bot.people.slash(CARD);
    await until(() => card().includes(en.terminal.noPicture), 'the sentence on the card');
    expect(card()).toContain('Turn to 0.9852 in: 65 teeth');
    expect(card().split(en.terminal.noPicture)).toHaveLength(2);
    expect(faults).toHaveLength(3);
    expect(bot.platform.posted).toHaveLength(1);
    expect(bot.platform.pictures).toEqual([]);
    expect(bot.platform.faults).toEqual([]);
  } finally {
    await bot.stop();
  }
});

test('no answer waits for a picture, its own or another', async () => {
  let release = (): void => undefined;
  const held = new Promise<void>((done) => {
    release = done;
  });
  const render = openRenderer();
  const draw = openDraw(
    en,
    (svg) => held.then(() => render(svg)),
    () => undefined,
  );
  const bot = await openBot({ draw });
  try {
    await bot.people.slash(CARD);
    await bot.people.slash(CARD, { id: 'U0SECOND' });
    await until(() => bot.platform.posted.length === 2, 'both cards');
    expect(bot.platform.pictures).toEqual([]);
    release();
    await until(() => bot.platform.pictures.length === 6, 'the pictures of both');
  } finally {
    release();
    await bot.stop();
  }
});

const channelSays = async (
  pictures: Parameters<typeof runChannel>[0]['pictures'],
): Promise<string> => {
  const input = new PassThrough();
  const output = new PassThrough();
  const said: Buffer[] = [];
  output.on('data', (chunk: Buffer) => said.push(chunk));
  input.end(`${LINE}\n`);
  await runChannel({
    desk,
    book: en,
    input,
    output,
    interactive: false,
    pictures,
    width: () => 80,
    onFault: () => undefined,
  });
  return Buffer.concat(said).toString();
};

test('the terminal prints the card, then the path of each picture once it is written', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'pictures-'));
  const render = openRenderer();
  const said = await channelSays((answer, line) =>
    writePictures(
      answer,
      { folder, prefix: `${String(line)}-` },
      { book: en, render, onFault: () => undefined },
    ),
  );
  const names = ['1-1-toothForm', '1-2-trackingStrip', '1-3-setupSketch'];
  expect(readdirSync(folder).sort()).toEqual(
    names.flatMap((name) => [`${name}.png`, `${name}.svg`]),
  );
  const paths = names.map((name) => join(folder, `${name}.png`));
  expect(said.indexOf('Turn to')).toBeLessThan(said.indexOf('Picture: '));
  for (const path of paths) {
    expect(said).toContain(`Picture: ${path}`);
    expect(PNG.sync.read(readFileSync(path)).width).toBe(PNG_WIDTH);
  }
});

test('where no pictures are wanted none is made, and where one fails nothing else is missing', async () => {
  expect(await channelSays(null)).not.toContain('Picture: ');
  const said = await channelSays(cannot);
  expect(said).toContain('Turn to 0.9852 in: 65 teeth');
  expect(said).toContain('Nothing else is missing from the card.');
});

test('one picture that fails leaves the others, and the sentence under them', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'pictures-'));
  const render = openRenderer((svg, width) =>
    svg.includes('data-picture="trackingStrip"') ? cannot() : openRenderer()(svg, width),
  );
  const faults: unknown[] = [];
  const said = await channelSays((answer) =>
    writePictures(
      answer,
      { folder, prefix: '' },
      { book: en, render, onFault: (error) => faults.push(error) },
    ),
  );
  expect(said).toContain(`Picture: ${join(folder, '1-toothForm.png')}`);
  expect(said).toContain(`Picture: ${join(folder, '3-setupSketch.png')}`);
  expect(said).not.toContain('2-trackingStrip.png');
  expect(said).toContain(en.terminal.noPicture);
  expect(faults).toHaveLength(1);
});

test('a refusal has no picture', async () => {
  expect(sketchesOf(await desk.answer(called('/knurl nonsense')), en)).toEqual([]);
});

test('the same picture is made once, and one that failed is tried again', async () => {
  const render = openRenderer();
  const [sketch] = sketchesOf(await desk.answer(called(LINE)), en);
  const svg = sketch?.svg ?? '';
  const [first, second, wider] = await Promise.all([render(svg), render(svg), render(svg, 400)]);
  expect(second).toBe(first);
  expect(wider).not.toBe(first);
  await expect(render('no picture')).rejects.toThrow();
  await expect(render('no picture')).rejects.toThrow();
});

test('two pictures are made at a time, and none is made twice that is still kept', async () => {
  const made: string[] = [];
  const going = new Set<string>();
  let most = 0;
  const render = openRenderer(async (svg) => {
    made.push(svg);
    going.add(svg);
    most = Math.max(most, going.size);
    await new Promise((done) => setTimeout(done, 5));
    going.delete(svg);
    if (svg === 'bad') throw new Error('no picture today');
    return new Uint8Array([made.length]);
  });
  const asked = ['a', 'b', 'c', 'a', 'd', 'b', 'e', 'f', 'a'];
  await Promise.all(asked.map((svg) => render(svg)));
  expect(most).toBe(2);
  expect(made).toEqual(['a', 'b', 'c', 'd', 'e', 'f']);
  await render('a');
  expect(made).toHaveLength(6);
  await Promise.allSettled([render('bad'), render('bad')]);
  await expect(render('bad')).rejects.toThrow();
  expect(made.slice(6)).toEqual(['bad', 'bad']);
});
