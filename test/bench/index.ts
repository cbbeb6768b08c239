/**
 * What things cost, as numbers of this machine and as ratios in one run. Nothing is asserted: a
 * time says little by itself, a ratio that changes says something.
 */
import { performance } from 'node:perf_hooks';
import { FLEET } from '../../commands/index.ts';
import { cardText, PHONE_WIDTH, spoken, terminalCall } from '../../src/adapters/terminal/index.ts';
import { dinCrib, dpCrib, mm, plan } from '../../src/calc/index.ts';
import { openDesk, plainShop } from '../../src/desk/index.ts';
import { en } from '../../src/phrases/index.ts';
import { MATERIAL_PHRASES, readLine, vocabularyOf } from '../../src/words/index.ts';
import { planJob, planRequest } from '../support/planJob.ts';
import {
  benchDiscord,
  MOST_ACK_MS as DISCORD_ACK_MS,
  discordLines,
  MOST_BLOCKED_MS,
} from './discord.ts';
import { benchFind } from './find.ts';
import { benchPictures, MOST_DELAY_MS } from './pictures.ts';
import { benchSlack, MOST_ACK_MS, slackLines } from './slack.ts';

const LINES = [
  '1.000 straight 21tpi 1018',
  '19mm diamond 1.0 pitch 304 long 30mm out 60mm',
  '7/8 diagonal left 96dp brass',
  'finish 0.995-1.005 straight 96dp 303',
  '20mm RGE 0.8 6061 wheel 20x8x6 bevel 1 fill 85%',
];
const ROUNDS = 600;
/** One in so many rounds is not measured: the engine is still warming up. */
const WARM_UP = 60;

const perSecond = async (work: (line: string) => unknown): Promise<number> => {
  for (let i = 0; i < WARM_UP; i += 1) for (const line of LINES) await work(line);
  const start = performance.now();
  for (let i = 0; i < ROUNDS; i += 1) for (const line of LINES) await work(line);
  return (1000 * ROUNDS * LINES.length) / (performance.now() - start);
};

const vocabulary = vocabularyOf(
  FLEET.find((command) => command.path.join(' ') === 'knurl setup')?.parameters ?? [],
  MATERIAL_PHRASES,
);
const desk = openDesk(FLEET, plainShop('in'));
const card = async (line: string): Promise<string> =>
  cardText(spoken(await desk.answer(terminalCall(line, 1)), en), PHONE_WIDTH);

// The least a bot does for a message of this size: take it apart and put it together again.
const sample = JSON.stringify({ text: await card(LINES[0] ?? '') });
const rows: readonly (readonly [name: string, perSecond: number])[] = [
  [
    'a message of this size, parsed and written',
    await perSecond(() => JSON.stringify(JSON.parse(sample))),
  ],
  ['lines read', await perSecond((line) => readLine(line, vocabulary, 'in'))],
  ['cards: read, worked out and written', await perSecond(card)],
];
const [, least] = rows[0] ?? ['', 1];

const print = (line: string): void => {
  process.stdout.write(`${line}\n`);
};
for (const [name, rate] of rows)
  print(
    `${name.padEnd(44)} ${rate.toFixed(0).padStart(9)} a second, ${(least / rate).toFixed(1)} times a bare message`,
  );
/** A crib of many wheels: the standards' own over again, until there are as many. */
const WHEELS_IN_CRIB = 500;
const crib = Array.from({ length: WHEELS_IN_CRIB }, (_, i) => {
  const all = [...dinCrib(), ...dpCrib()];
  const wheel = all[i % all.length];
  if (wheel === undefined) throw new Error('no wheels in the standards');
  return { ...wheel, name: `${wheel.name} no. ${String(i)}` };
});

const planTimes = (said: Parameters<typeof planJob>[1]): readonly number[] =>
  Array.from({ length: 12 }, () => {
    const start = performance.now();
    const job = planJob('steel-medC-CD', { pitch: null, ...said });
    plan(planRequest(job, { limits: { low: mm(19.9), high: mm(20) }, crib }));
    return performance.now() - start;
  });

const NONE_PASSES = { bore: mm(17.2), stickout: mm(400), length: mm(20) };
for (const [name, said] of [
  ['where many pass', {}],
  ['where none passes', NONE_PASSES],
] as const)
  print(
    `plan from ${String(WHEELS_IN_CRIB)} wheels, ${name}: ${Math.max(...planTimes(said)).toFixed(0)} ms at the worst`,
  );
print(`pictures (event loop asked to stay under ${String(MOST_DELAY_MS)} ms behind):`);
print(JSON.stringify(await benchPictures(), null, 2));
for (const { engine, few, many } of await benchFind())
  print(
    `finding in ${engine}: ${few.toFixed(1)} ms among a thousand entries, ${(many / few).toFixed(2)} times that among a hundred thousand`,
  );
print(`two hundred at once in Slack (which gives ${String(MOST_ACK_MS)} ms to acknowledge):`);
for (const said of slackLines(await benchSlack())) print(said);
print(
  `two hundred at once in Discord (which gives ${String(DISCORD_ACK_MS)} ms; the event loop asked to stay under ${String(MOST_BLOCKED_MS)} ms):`,
);
for (const said of discordLines(await benchDiscord())) print(said);
