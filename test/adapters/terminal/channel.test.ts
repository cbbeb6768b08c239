/** A whole shop in one terminal: who speaks, where, and what happens besides the answers. */
import fs from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { FLEET } from '../../../commands/index.ts';
import { type Card, line } from '../../../src/card/index.ts';
import { cardReply, defineCommand, type Effect } from '../../../src/desk/index.ts';
import { ENGINES, newFolder } from '../../support/places.ts';
import { newRecords } from '../../support/records.ts';
import { play } from '../../support/terminal.ts';

const CARD: Card = {
  verb: 'standard',
  headline: line('roleNamed', { name: 'Mara', role: 'supervisor' }),
  parts: [],
  choices: [],
  pictures: [],
  figures: {},
  checks: [],
  cautions: [],
  alternatives: [],
  units: 'in',
};

/** Leaves one effect of each kind. */
const EFFECTS: readonly Effect[] = [
  { effect: 'post', key: 'k1', place: 'standards/', card: CARD },
  { effect: 'pin', key: 'k2', of: 'k1' },
  { effect: 'thread', key: 'k3', of: 'k1', title: 'Which wheel?' },
  {
    effect: 'post',
    key: 'k4',
    of: 'k3',
    ring: { people: ['mara', 'ben'], groups: ['engineers'] },
    card: CARD,
  },
  { effect: 'notify', key: 'k5', people: ['ben'], card: CARD },
  { effect: 'edit', key: 'k6', of: 'k1', card: CARD },
  { effect: 'unpin', key: 'k7', of: 'k2' },
  { effect: 'unpin', key: 'k8', message: { place: 'standards/', message: '0a1b' } },
];
const herald = defineCommand({
  path: ['shop', 'herald'],
  examples: ['/shop herald'],
  parameters: z.object({}),
  allowed: 'operator',
  run: () => cardReply({ ...CARD, headline: line('settings', {}) }, EFFECTS),
});
const fleet = [...FLEET, herald];

/** What was shown, one paragraph to each line that was typed. */
const turns = (said: string): readonly string[] => said.trimEnd().split(/\n\n(?=[^\n]*> )/u);

describe.each(ENGINES)('on %s', (engine) => {
  it('everything that happens is a line under its answer, in its order, once', async () => {
    const { store } = await newRecords(engine);
    const said = await play({ store, fleet, lines: ['/shop herald', '/shop people'] });
    const [first = '', second = ''] = turns(said);
    expect(first.split('\n')).toEqual([
      '> /shop herald',
      'What this shop has set:',
      '',
      '→ Posted in #standards: Mara is supervisor',
      '  now.',
      '→ Pinned in #standards: Mara is supervisor',
      '  now.',
      expect.stringMatching(/^→ Thread #standards\/[0-9a-f]{4} opened: Which wheel\?$/u),
      expect.stringMatching(/^→ Posted in #standards\/[0-9a-f]{4}, for Mara, Ben and$/u),
      '  Engineers: Mara is supervisor now.',
      '→ Ben told: Mara is supervisor now.',
      '→ Changed in #standards: Mara is supervisor',
      '  now.',
      '→ Pin taken off in #standards: Mara is',
      '  supervisor now.',
      '→ Pin taken off in #standards: 0a1b',
    ]);
    expect(second).toContain('1 person:');
    expect(second).not.toContain('→');
  });

  it('whoever is named speaks: the first is owner, others are met as operators', async () => {
    const { store } = await newRecords(engine);
    const lines = [
      '/as mara',
      '/shop people add ben lee engineer',
      '/as BEN LEE',
      '/shop people',
      '/shop people change Mara operator',
      '/AS Cy',
      '/shop wheels add A straight 21 tpi',
      '/shop people show cy',
    ];
    const said = turns(await play({ store, fleet, lines }));
    expect(said[0]).toBe('> /as mara\nMara speaks, in #floor.');
    expect(said[3]).toContain('Mara        owner');
    expect(said[3]).toMatch(/ben lee +engineer/iu);
    expect(said[3]).toContain('2 people:');
    expect(said[4]).toContain('That needs the role owner. Ask Mara.');
    expect(said[6]).toContain('That needs the role supervisor. Ask Mara.');
    expect(said[7]).toMatch(/Role +operator/u);
  });

  it('what is asked in a channel or a thread stays there', async () => {
    const { store } = await newRecords(engine);
    const lines = [
      '1.000 straight 21tpi 1018',
      '/in #Bench/3fa2',
      '/knurl why infeed',
      '/in',
      '/shop settings change notices here',
      '/in floor',
      '/knurl why infeed',
    ];
    const said = turns(await play({ store, fleet, lines }));
    // In another place there is no card yet to ask about.
    expect(said[2]).toMatch(/^#bench\/3fa2> /u);
    expect(said[2]).not.toContain('0.0118');
    expect(said[3]).toContain('Terminal speaks, in #bench/3fa2.');
    expect(said[4]).toMatch(/Notices go to +bench/u);
    expect(said[6]).toContain('0.0118');
  });
});

it('a name too long and a channel that is none are refused, and nobody moves', async () => {
  const { store } = await newRecords('sqlite');
  const lines = [`/as ${'x'.repeat(61)}`, '/in two words', '/in a/b/c', '/as', '/as-is 1.000'];
  const said = turns(await play({ store, fleet, lines }));
  expect(said[0]).toContain('That is too long for a name.');
  for (const at of [1, 2]) expect(said[at]).toContain('is no channel');
  expect(said[3]).toBe('> /as\nTerminal speaks, in #floor.');
  // Only the word by itself changes who speaks.
  expect(said[4]).not.toContain('speaks');
});

it('nothing is wider than a phone, whatever was typed', async () => {
  const { store } = await newRecords('sqlite');
  const lines = ['/shop herald', `/in ${'y'.repeat(59)}`, '/shop settings', '/in'];
  const said = await play({ store, fleet, lines });
  const shown = said.split('\n').filter((each) => !each.includes('> '));
  for (const each of shown) expect(each.length).toBeLessThanOrEqual(48);
});

it('a file is taken in behind its sign, and those of an answer are handed over to who may have them', async () => {
  const { store } = await newRecords('sqlite');
  const folder = newFolder();
  const crib = path.join(folder, 'crib.csv');
  fs.writeFileSync(crib, 'name,form,pitch\nAsh,straight,21 tpi\nBeech,straight,25 tpi\n');
  const files = path.join(folder, 'files');
  const lines = [
    '/as mara',
    `/shop wheels import < ${crib}`,
    `/shop wheels import < ${crib}.not`,
    '/shop export',
    '/as kit',
    '/shop export',
    '/shop rules add Crest < 0.99 only on the drawing',
  ];
  const said = turns(await play({ store, fleet, lines, files }));
  expect(said[1]).toContain('2 wheels added.');
  expect(said[2]?.replaceAll(/\s+/gu, ' ')).toContain('Nothing was taken in; check its name.');
  const wheels = fs.readdirSync(files).find((name) => name.endsWith('wheel.csv')) ?? '';
  expect(said[3]).toContain(`File: ${path.join(files, wheels)}`);
  expect(fs.readFileSync(path.join(files, wheels), 'utf8')).toContain('Beech');
  expect(fs.statSync(path.join(files, wheels)).mode & 0o077).toBe(0);
  expect(said[5]).toContain('That needs the role owner.');
  expect(said[5]).not.toContain('File:');
  // Only an import has a file behind the sign.
  expect(said[6]).not.toContain('no file');
});
