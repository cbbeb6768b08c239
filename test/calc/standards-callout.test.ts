import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Pattern } from '../../src/calc/pattern.ts';
import type { Pitch } from '../../src/calc/pitch.ts';
import {
  type Callout,
  DIN_82,
  DIN_FORMS,
  DIN_PITCHES,
  type DinForm,
  JIS_MODULES,
  readCallout,
  writeCallout,
} from '../../src/calc/standards/index.ts';
import { degrees } from '../../src/calc/units.ts';

const STRAIGHT: Pattern = { kind: 'straight' };
const DIAMOND: Pattern = { kind: 'diamond', points: 'raised' };
const none = { form: null, pattern: null, pitch: null, included: null, knurlClass: null } as const;

const metric = (value: number): Pitch => ({ system: 'metric', value });
const din = (form: DinForm, t: number | null, profile = 90): Callout => ({
  ...none,
  standard: 'din82',
  form,
  pattern: DIN_82[form].pattern,
  pitch: t === null ? null : metric(t),
  included: degrees(profile),
});
const dp = (value: number, rest: Partial<Callout> = {}): Callout => ({
  ...none,
  standard: 'asme',
  pitch: { system: 'dp', value },
  ...rest,
});
const jis = (value: number, pattern: Pattern | null): Callout => ({
  ...none,
  standard: 'jis',
  pattern,
  pitch: { system: 'module', value },
});
const tpi = (value: number, pattern: Pattern | null = null): Callout => ({
  ...none,
  standard: 'tpi',
  pattern,
  pitch: { system: 'tpi', value },
});
const gost = (value: number, pattern: Pattern): Callout => ({
  ...none,
  standard: 'gost',
  pattern,
  pitch: metric(value),
});

const readAll = (text: string) => expect(readCallout(text));

describe('spellings of DIN 82', () => {
  it.each<[string, Callout]>([
    // evidence: DIN 82 (January 1973), designation, read
    ['Rändel RGE 08 DIN 82', din('RGE', 0.8)],
    ['RGE 08 - 105', din('RGE', 0.8, 105)],
    // evidence: reported
    ['DIN 82-RAA 0,8', din('RAA', 0.8)],
    // evidence: from memory
    ['DIN 82 - RGE 0,8', din('RGE', 0.8)],
    // evidence: the same three pitches as typed: 0,8 0.8 08
    ['rge 0,8', din('RGE', 0.8)],
    ['rge 0.8', din('RGE', 0.8)],
    ['rge 08', din('RGE', 0.8)],
    ['rge08', din('RGE', 0.8)],
    ['rge .8', din('RGE', 0.8)],
    ['rge t 0.8', din('RGE', 0.8)],
    ['rge 0.8 mm', din('RGE', 0.8)],
    ['din 82 raa 1', din('RAA', 1)],
    ['din82 raa 10', din('RAA', 1)],
    ['din-82 rkv 1,6', din('RKV', 1.6)],
    ['raendel rbl 12 din 82', din('RBL', 1.2)],
    ['randel rbr 16', din('RBR', 1.6)],
    ['rgv 05 din 82 - 1973-01', din('RGV', 0.5)],
    ['din 82:1973 rke 0.6', din('RKE', 0.6)],
    ['rge 08 - 105 din 82', din('RGE', 0.8, 105)],
    ['din 82 rge 0.8 105°', din('RGE', 0.8, 105)],
    ['din 82 rge 0,8 - 90', din('RGE', 0.8)],
    ['rge', din('RGE', null)],
  ])('%s', (text, callout) => {
    readAll(text).toEqual({ callout, length: text.length });
  });

  it('all seven forms, with and without 105°', () => {
    for (const form of DIN_FORMS)
      for (const profile of [90, 105])
        for (const t of DIN_PITCHES) {
          const text = `${form} ${t} ${profile === 90 ? '' : '- 105 '}DIN 82`;
          readAll(text).toEqual({ callout: din(form, t, profile), length: text.length });
        }
  });
});

describe('spellings of ANSI/ASME B94.6', () => {
  it.each<[string, Callout]>([
    // evidence: N = P·D, P the diametral pitch (handbook); the order of the words from memory
    ['96 DP STRAIGHT', dp(96, { pattern: STRAIGHT })],
    ['96dp', dp(96)],
    ['96-DP', dp(96)],
    ['96 d.p.', dp(96)],
    ['96 diametral pitch', dp(96)],
    ['P96', dp(96)],
    ['p 96', dp(96)],
    ['p=160', dp(160)],
    ['96DP class II', dp(96, { knurlClass: 'II' })],
    ['96 dp class 3', dp(96, { knurlClass: 'III' })],
    ['96 dp cl. i', dp(96, { knurlClass: 'I' })],
    ['P96 STRAIGHT KNURL CLASS III', dp(96, { pattern: STRAIGHT, knurlClass: 'III' })],
    ['straight 96 dp class ii', dp(96, { pattern: STRAIGHT, knurlClass: 'II' })],
    ['class ii, 96 dp, straight', dp(96, { pattern: STRAIGHT, knurlClass: 'II' })],
    ['128 dp raised diamond knurl, class i', dp(128, { pattern: DIAMOND, knurlClass: 'I' })],
    ['64 dp diagonal left', dp(64, { pattern: { kind: 'diagonal', hand: 'left' } })],
    ['right-hand diagonal 64 dp', dp(64, { pattern: { kind: 'diagonal', hand: 'right' } })],
    ['160 dp female diamond', dp(160, { pattern: { kind: 'diamond', points: 'sunk' } })],
    ['ansi/asme b94.6 96 dp straight', dp(96, { pattern: STRAIGHT })],
    ['ASME B94.6-1984 96 DP', dp(96)],
    ['96 dp straight ansi b94.6', dp(96, { pattern: STRAIGHT })],
    // A class the pattern does not have is read all the same: the card says what is wrong with it.
    ['96 dp diamond class ii', dp(96, { pattern: DIAMOND, knurlClass: 'II' })],
    [
      'b94.6 straight class ii',
      { ...dp(96, { pattern: STRAIGHT, knurlClass: 'II' }), pitch: null },
    ],
  ])('%s', (text, callout) => {
    readAll(text).toEqual({ callout, length: text.length });
  });
});

describe('spellings of JIS, GOST and teeth per inch', () => {
  it.each<[string, Callout]>([
    // evidence: JIS B 0951: kind and module; the order of the words from memory
    ['JIS B 0951 straight m 0.3', jis(0.3, STRAIGHT)],
    ['JIS B 0951 diamond m0.5', jis(0.5, DIAMOND)],
    ['diamond m 0.2 jis b 0951', jis(0.2, DIAMOND)],
    ['jis b0951:1962 straight m=0.5', jis(0.5, STRAIGHT)],
    ['JIS B 0951 アヤ目 m0.3', jis(0.3, DIAMOND)],
    ['平目 m 0.5', jis(0.5, STRAIGHT)],
    ['m0.3', jis(0.3, null)],
    ['m 0,3', jis(0.3, null)],
    ['0.3 module diamond', jis(0.3, DIAMOND)],
    ['jis m 0.4', jis(0.4, null)],
    // evidence: teeth per inch, as wheels are labelled (reported)
    ['21 TPI', tpi(21)],
    ['21tpi straight', tpi(21, STRAIGHT)],
    ['straight 21 t.p.i.', tpi(21, STRAIGHT)],
    ['33 tpi diamond', tpi(33, DIAMOND)],
    ['20 teeth per inch', tpi(20)],
    // evidence: GOST 21474-75: kinds and pitches; the order of the words from memory
    ['GOST 21474-75 straight 0.8', gost(0.8, STRAIGHT)],
    ['diamond 1,0 gost 21474-75', gost(1, DIAMOND)],
    ['straight 0,8 gost', gost(0.8, STRAIGHT)],
    ['Рифление прямое 1,0 ГОСТ 21474-75', gost(1, STRAIGHT)],
    ['Рифление сетчатое 2,0 ГОСТ 21474-75', gost(2, DIAMOND)],
  ])('%s', (text, callout) => {
    readAll(text).toEqual({ callout, length: text.length });
  });
});

describe('a callout among other words', () => {
  it.each([
    ['rge 08 din 82 20mm', 'rge 08 din 82'],
    ['rge 0,8, 20 mm', 'rge 0,8'],
    ['rge 20', 'rge'],
    ['rge 16mm', 'rge'],
    ['rge 0.875 in', 'rge'],
    ['rge 0.8 1.0 bar', 'rge 0.8'],
    ['rge 0.8 90 out', 'rge 0.8'],
    ['rge 1.5 long', 'rge'],
    // It once gave the pitch away as a length that nothing was done with.
    ['rge 0.8 long 15mm', 'rge 0.8'],
    ['rge 3/4', 'rge'],
    ['din 82 raa 0,8 rge 1', 'din 82 raa 0,8'],
    ['96 dp straight 1.0 long', '96 dp straight'],
    ['96 dp, straight, class ii.', '96 dp, straight, class ii'],
    ['96 dp 33 tpi', '96 dp'],
    ['96 dp straight diamond', '96 dp straight'],
    ['21 tpi square edge', '21 tpi'],
    ['21 tpi straight class ii', '21 tpi straight'],
    ['m0.3 tpi', 'm0.3'],
    ['rge 0.8 diamond', 'rge 0.8'],
  ])('%s: takes only "%s"', (text, taken) => {
    const read = readCallout(text);
    expect(read).not.toBeNull();
    expect('length' in read! ? text.slice(0, read.length) : read).toBe(taken);
  });

  it.each([
    '1.0 96 dp',
    'straight',
    'straight 0.8',
    'class ii',
    'knurl 20 mm',
    'p20',
    'p 0.8',
    '0.5 m',
    'm 0.4',
    'm6',
    'm0.3 in',
    'ra 0.8',
    'raw 0.8',
    'rod 0.8',
    'ram 08',
    'round 1.0',
    'rgex',
    '96 dpi',
    '',
  ])('none stands at the beginning of "%s"', (text) => {
    readAll(text).toBeNull();
  });
});

describe('an unknown form', () => {
  it.each<[string, string, readonly DinForm[]]>([
    ['rgx 0.8', 'RGX', ['RGE', 'RGV']],
    ['RGF 08 DIN 82', 'RGF', ['RGE', 'RGV']],
    ['rg 0.8', 'RG', ['RGE', 'RGV']],
    ['rbx 1.0', 'RBX', ['RBL', 'RBR']],
    ['rab 0.8', 'RAB', ['RAA']],
    ['rka 08', 'RKA', ['RAA', 'RKE', 'RKV']],
    ['din 82 xge 0.8', 'XGE', ['RGE']],
    ['Rändel RGW 08 DIN 82', 'RGW', ['RGE', 'RGV']],
    ['din 82 0.8', 'DIN 82', DIN_FORMS],
    ['din 82 diamond 0.8', 'DIN 82', ['RGE', 'RGV']],
    ['din 82 straight', 'DIN 82', ['RAA']],
  ])('%s: %s, nearest %o', (text, word, nearest) => {
    const read = readCallout(text);
    expect(read).toMatchObject({ problem: 'unknownForm', word, nearest });
    const { start, end } = read as { start: number; end: number };
    expect(text.slice(start, end).toUpperCase()).toBe(word);
  });
});

const patterns: fc.Arbitrary<Pattern> = fc.constantFrom<Pattern>(
  STRAIGHT,
  DIAMOND,
  { kind: 'diamond', points: 'sunk' },
  { kind: 'diagonal', hand: 'left' },
  { kind: 'diagonal', hand: 'right' },
  { kind: 'diagonal', hand: null },
  { kind: 'square', points: 'raised' },
);
const maybe = <T>(value: fc.Arbitrary<T>): fc.Arbitrary<T | null> => fc.option(value);
const hundredths = fc.integer({ min: 20, max: 320 }).map((n) => n / 100);

const callouts: fc.Arbitrary<Callout> = fc.oneof(
  fc
    .record({
      form: fc.constantFrom(...DIN_FORMS),
      t: fc.oneof(fc.constantFrom(...DIN_PITCHES), hundredths),
      profile: fc.constantFrom(90, 105, 70),
    })
    .map(({ form, t, profile }) => din(form, t, profile)),
  fc
    .record({
      value: fc.integer({ min: 20, max: 400 }),
      pattern: maybe(patterns),
      knurlClass: maybe(fc.constantFrom('I', 'II', 'III')),
    })
    .map(({ value, ...rest }) => dp(value, rest)),
  fc
    .record({ m: fc.constantFrom(...JIS_MODULES, 0.25, 0.4), pattern: maybe(patterns) })
    .map(({ m, pattern }) => jis(m, pattern)),
  fc
    .record({ value: fc.integer({ min: 8, max: 100 }), pattern: maybe(patterns) })
    .map(({ value, pattern }) => tpi(value, pattern)),
  fc.record({ t: hundredths, pattern: patterns }).map(({ t, pattern }) => gost(t, pattern)),
);

describe('a callout that is written', () => {
  it('is read back as it was, capitals or not, and to its last character', () => {
    fc.assert(
      fc.property(callouts, (callout) => {
        const text = writeCallout(callout);
        readAll(text).toEqual({ callout, length: text.length });
        readAll(text.toLowerCase()).toEqual({ callout, length: text.length });
      }),
    );
  });

  it('is read back with other words behind it', () => {
    const tails = fc.constantFrom(' 20mm', ', 20 mm bar', ' finish 19.9-20', ' 1.000 in', ' out 3');
    fc.assert(
      fc.property(callouts, tails, (callout, tail) => {
        const text = writeCallout(callout);
        readAll(`${text}${tail}`).toEqual({ callout, length: text.length });
      }),
    );
  });

  it.each<[Callout, string]>([
    // evidence: DIN 82, designation, read; with 105° composed from the two that were read
    [din('RGE', 0.8), 'Rändel RGE 08 DIN 82'],
    [din('RGE', 0.8, 105), 'Rändel RGE 08 - 105 DIN 82'],
    [din('RAA', 1), 'Rändel RAA 10 DIN 82'],
    [din('RAA', 0.75), 'Rändel RAA 0,75 DIN 82'],
    [din('RAA', 3), 'Rändel RAA 3,0 DIN 82'],
    // evidence: from memory
    [dp(96, { pattern: STRAIGHT, knurlClass: 'II' }), '96 DP STRAIGHT CLASS II'],
    [dp(128, { pattern: DIAMOND }), '128 DP RAISED DIAMOND'],
    [jis(0.3, STRAIGHT), 'JIS B 0951 STRAIGHT m 0.3'],
    [tpi(21, STRAIGHT), '21 TPI STRAIGHT'],
    [gost(0.8, STRAIGHT), 'GOST 21474-75 STRAIGHT 0,8'],
    // A pitch of 3 was once written without a decimal and read back as no pitch at all.
    [gost(3, STRAIGHT), 'GOST 21474-75 STRAIGHT 3,0'],
  ])('%o', (callout, text) => {
    expect(writeCallout(callout)).toBe(text);
  });
});
