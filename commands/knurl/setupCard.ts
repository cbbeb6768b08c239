import {
  CHOSEN_CAUTIONS,
  type Check,
  type CheckName,
  DWELL_TURNS,
  type FamilyGrowth,
  MATERIALS,
  type Mm,
  materialById,
  mm,
  type PitchBasis,
  type RemedyKind,
  type SetupRequest,
  type SetupResult,
  USUAL_MATERIALS,
  waysOfSetUp,
} from '../../src/calc/index.ts';
import {
  type Card,
  type Choice,
  type Line,
  label,
  line,
  type Part,
  type Row,
  row,
} from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import { type Machine, onDial } from '../../src/shop/index.ts';
import { partOf } from '../../src/words/index.ts';
import { askChoices, troubleChoice } from './nextMoves.ts';
import { setupPictures } from './pictures.ts';
import { logChoices } from './resultChoices.ts';
import type { SetupWords } from './setupParameters.ts';
import { growthLines } from './shopGrowth.ts';
import { reworded } from './words.ts';

/** What the card is made from. */
export type Worked = {
  readonly context: Context;
  readonly said: SetupWords;
  readonly request: SetupRequest;
  readonly result: SetupResult;
  readonly materialAssumed: boolean;
  /** The shop's machine that was named. */
  readonly machine: Machine | null;
  /** What the shop has seen of the growth of such a part. */
  readonly growth: FamilyGrowth | null;
};

/** Cautions shown by name; the standing ones follow in short. */
const SHOWN_CAUTIONS = 3;

/** Words that a choice of another blank takes back. */
const BLANK_WORDS = ['teeth', 'asIs'] as const;

/** One change may lift several stops: it is told once. */
const eachRemedy = ({ remedies }: SetupResult): SetupResult['remedies'] =>
  remedies.filter(
    (remedy, index) => remedies.findIndex(({ words }) => words === remedy.words) === index,
  );

/** What lifts the stop that the headline names; another stop has changes of its own. */
const liftingLines = (result: SetupResult): readonly Line[] => {
  const stop = worstStop(result.checks);
  const remedies = eachRemedy(result).filter(({ check }) => check === stop?.name);
  return remedies.length === 0 ? [] : [line('passesWith', { remedies })];
};

/** What a remedy's words take the place of. */
const REMEDY_REPLACES: { readonly [K in RemedyKind]: readonly string[] } = {
  stickout: ['stickout'],
  tailstock: ['support'],
  moreTurns: ['turns', 'feed'],
  slower: ['speed', 'rotation'],
  narrowerWheel: ['wheel'],
  plug: ['plug'],
  opposed: ['layout'],
  cut: ['process'],
};

const worstStop = (checks: readonly Check[]): Check | null =>
  checks.find((check) => check.state === 'stop') ?? null;

const headline = ({ request, result }: Worked): Line => {
  const stop = worstStop(result.checks);
  if (stop !== null) return line('stopped', { check: stop });
  const { diameter: blankDiameter, teeth: toothCount } = result.blank;
  const left = request.stock !== null && Math.abs(request.stock - blankDiameter) < 1e-6;
  return line(left ? 'leaveAt' : 'turnTo', { blankDiameter, toothCount });
};

const blankLines = (w: Worked): readonly Line[] => {
  const { request, result } = w;
  const { diameter: blankDiameter, teeth: toothCount } = result.blank;
  const lines: Line[] = [];
  if (worstStop(result.checks) !== null)
    lines.push(...liftingLines(result), line('wouldTurnTo', { blankDiameter, toothCount }));
  lines.push(line('windowTracks', result.window));
  if (request.knurlClass !== null)
    lines.push(line('classWindow', { knurlClass: request.knurlClass }));
  if (request.stock !== null && request.asIs)
    lines.push(
      line('asItIs', {
        stock: request.stock,
        toothError: result.figures.stockToothError?.value ?? 0,
      }),
    );
  if (request.stock !== null && result.asIs !== null)
    lines.push(line('leaveItOption', { stock: request.stock, ...result.asIs }));
  if (request.finish !== null && request.aimOnly === true)
    lines.push(line('finishAimed', { size: request.finish.low }));
  else if (request.finish !== null)
    lines.push(
      line('finishMet', {
        limits: request.finish,
        fillMoved: result.blank.fillMoved,
        fill: result.blank.tooth.fill,
      }),
    );
  return lines;
};

/** How a helical label was taken, unless a standard's own callout says what its pitch measures. */
const unclearBasis = ({ said, result }: Worked): PitchBasis | null =>
  said.callout === undefined ? result.pitch.took : null;

/** The one diameter beside a callout or a class, whose own nominal is the finished size. */
const calledOutBar = ({ request, said }: Worked): Mm | null =>
  request.finish === null && (said.callout !== undefined || request.knurlClass !== null)
    ? request.stock
    : null;

/** Whatever the bot chose by itself is said, in the first lines. */
const choiceLines = (w: Worked): readonly Line[] => {
  const { request, result, said } = w;
  const lines: Line[] = [];
  const took = unclearBasis(w);
  if (took !== null)
    lines.push(
      line('pitchTaken', {
        took,
        toothCount: result.blank.teeth,
        otherCount: result.otherWayTeeth,
      }),
    );
  const helical = request.pattern.kind === 'diagonal' || request.pattern.kind === 'diamond';
  if (helical && said.helix === undefined && said.tilt === undefined)
    lines.push(line('helixTaken', { helix: result.pitch.helix }));
  const bar = calledOutBar(w);
  if (bar !== null) lines.push(line('calloutBar', { stock: bar }));
  if (request.plate !== undefined && request.plate !== null)
    lines.push(
      line('plateTaken', {
        thickness: request.plate,
        crest: mm(result.blank.tooth.crest + 2 * request.plate),
      }),
    );
  if (w.materialAssumed) lines.push(line('materialTaken', request.material));
  if (result.switchedToCut) lines.push(line('processSwitched', request.material));
  return lines;
};

const motionRows = ({ request, result }: Worked): readonly Row[] => {
  const { motion } = result;
  const { time } = motion;
  const { batch } = request;
  if (motion.travel === 'plunge')
    return [row('plunge', { turns: motion.turns ?? 0, dwell: DWELL_TURNS, time, batch })];
  if (motion.feed === null || motion.feedLow === null || motion.feedHigh === null) return [];
  return [
    row('traverse', {
      feed: motion.feed,
      low: motion.feedLow,
      high: motion.feedHigh,
      turns: motion.turns,
      time,
      batch,
    }),
  ];
};

const toothRows = ({ result }: Worked): readonly Row[] => {
  const { tooth } = result.blank;
  const { firstBite, crestFlat, sharpHeight } = result.figures;
  const cut = result.process === 'cut';
  if (firstBite === null || crestFlat === null || sharpHeight === null) return [];
  const { crest, crestLow: low, crestHigh: high, height, fill } = tooth;
  return [
    row('feedIn', { infeed: tooth.infeed, cut }),
    row('firstTurn', { firstBite: mm(firstBite.value) }),
    row('stopWhen', { crestFlat: mm(crestFlat.value), crest, low, high, cut }),
    row('toothHeight', { height, fill, sharpHeight: mm(sharpHeight.value) }),
  ];
};

const runRows = (w: Worked): readonly Row[] => {
  const { running } = w.result;
  if (running === null) return [];
  const { rotation: spindleSpeed, surfaceSpeed } = running;
  return [row('run', { spindleSpeed, surfaceSpeed }), ...motionRows(w)];
};

/** Machine numbers as the machine shows them. */
const dialRows = ({ context, machine, result }: Worked): readonly Row[] => {
  const { firstBite } = result.figures;
  if (machine === null || firstBite === null) return [];
  const [infeed, bite] = [result.blank.tooth.infeed, mm(firstBite.value)].map((each) =>
    onDial(machine, each),
  );
  if (infeed === undefined || bite === undefined) return [];
  return [
    row('onDial', {
      dial: machine.dial,
      units: machine.units ?? context.units,
      infeed,
      firstBite: bite,
    }),
  ];
};

const rows = (w: Worked): readonly Row[] => {
  const [feedIn, firstTurn, stopWhen, ...more] = toothRows(w);
  const first = [feedIn, firstTurn, stopWhen].filter((each) => each !== undefined);
  return [
    ...first.slice(0, 2),
    ...dialRows(w),
    ...first.slice(2),
    ...runRows(w),
    ...more,
    row('material', w.request.material),
  ];
};

const wheelLines = ({ growth, request, result, said }: Worked): readonly Line[] => {
  const lines: Line[] = [];
  const { counted, pitch } = request;
  if (counted !== null && pitch !== null)
    lines.push(line('labelOverruled', { label: pitch, counted, normal: result.pitch.normal }));
  lines.push(line('wheelNeeded', { wheel: result.wheel, pattern: request.pattern }));
  if (said.wheel === undefined)
    lines.push(line('wheelTaken', { wheel: request.wheel, edge: result.wheelInUse.edge }));
  if (result.motion.travel === 'traverse')
    lines.push(
      line('startHalfOn', { chamfer: result.blank.tooth.height, clearance: request.wheel.face }),
    );
  if (said.feed !== undefined && result.motion.travel === 'plunge')
    lines.push(line('feedNeedsLength', {}));
  return [...lines, ...growthLines(growth, request, result.process)];
};

const blankChoices = (w: Worked): readonly Choice[] => {
  const { context, request, result } = w;
  const [smaller] = result.alternatives;
  const teeth = (count: number): string => reworded(context, BLANK_WORDS, `${String(count)} teeth`);
  const choices: Choice[] = [];
  if (request.stock !== null && result.asIs !== null)
    choices.push({
      label: label('asIs', { stock: request.stock }),
      words: reworded(context, BLANK_WORDS, 'as-is'),
    });
  if (smaller !== undefined)
    choices.push({ label: label('smaller', smaller), words: teeth(smaller.toothCount) });
  if (result.larger !== null)
    choices.push({ label: label('larger', result.larger), words: teeth(result.larger.toothCount) });
  return choices;
};

/** A stop comes with the smallest changes that pass, as lines to send. */
const remedyChoices = ({ context, result }: Worked): readonly Choice[] =>
  eachRemedy(result).map(({ kind, number, words }) => ({
    label: label('remedy', { kind, number }),
    words: reworded(context, REMEDY_REPLACES[kind], words),
  }));

const isStopped = (checks: readonly Check[], name: CheckName): boolean =>
  checks.some((check) => check.name === name && check.state === 'stop');

/** A stop that something said brought about: the line without it. */
const wayBackChoices = ({ context, result, said }: Worked): readonly Choice[] => {
  const stopped = (name: CheckName): boolean => isStopped(result.checks, name);
  const choices: Choice[] = [];
  if (stopped('speed') && (said.speed !== undefined || said.rotation !== undefined))
    choices.push({
      label: label('ownSpeed', {}),
      words: reworded(context, ['speed', 'rotation'], ''),
    });
  if (stopped('material'))
    choices.push({ label: label('cutInstead', {}), words: reworded(context, ['process'], 'cut') });
  if (stopped('edge') && said.edge !== undefined)
    choices.push({ label: label('bevelled', {}), words: reworded(context, ['edge'], 'beveled') });
  if (stopped('fill') && said.fill !== undefined)
    choices.push({ label: label('ownFill', {}), words: reworded(context, ['fill'], '') });
  return choices;
};

/** The shortest name that reads as this row of the table. */
const shortName = (id: string): string =>
  MATERIALS.find((material) => material.id === id)?.aliases[0] ?? id;

const materialChoices = ({ context, materialAssumed }: Worked): readonly Choice[] =>
  materialAssumed
    ? USUAL_MATERIALS.flatMap((id) => {
        const material = materialById(id);
        return material === undefined
          ? []
          : [{ label: label('material', material), words: reworded(context, [], shortName(id)) }];
      })
    : [];

const finishedSizeChoices = (w: Worked): readonly Choice[] => {
  const size = calledOutBar(w);
  const [span] = w.context.read.spans.get('diameter') ?? [];
  if (size === null || span === undefined) return [];
  const typedSize = partOf(w.context.text, span);
  return [
    {
      label: label('finishedSize', { size }),
      words: reworded(w.context, ['diameter', 'asIs', 'teeth'], `finish ${typedSize}`),
    },
  ];
};

const choices = (w: Worked): readonly Choice[] => {
  const { context } = w;
  const took = unclearBasis(w);
  const others = context.units === 'in' ? 'mm' : 'in';
  const shown = w.said.units ?? context.units;
  const turned = shown === context.units ? others : context.units;
  return [
    ...remedyChoices(w),
    ...wayBackChoices(w),
    ...finishedSizeChoices(w),
    ...blankChoices(w).slice(0, 1),
    ...logChoices(context),
    ...(took === null
      ? []
      : [
          {
            label: label('otherBasis', { took }),
            words:
              took === 'normal' ? reworded(context, [], 'rim') : reworded(context, ['rim'], ''),
          },
        ]),
    ...blankChoices(w).slice(1),
    {
      label: label('otherUnits', { units: turned }),
      words: reworded(context, ['units'], `show ${turned}`),
    },
    ...materialChoices(w),
    troubleChoice(context),
    ...askChoices(context),
  ];
};

const parts = (w: Worked): readonly Part[] => {
  const { cautions, checks } = w.result;
  const chosen = CHOSEN_CAUTIONS.filter((id) => cautions.includes(id));
  return [
    { part: 'lines', lines: [...blankLines(w), ...choiceLines(w)] },
    { part: 'rows', rows: rows(w) },
    { part: 'checks', checks },
    { part: 'lines', lines: wheelLines(w) },
    {
      part: 'cautions',
      shown: chosen.slice(0, SHOWN_CAUTIONS),
      rest: chosen.slice(SHOWN_CAUTIONS),
      all: cautions,
    },
    { part: 'footing' },
  ];
};

/** The set-up card: the line to act on, the numbers, the checks, the cautions, the next moves. */
export const setupCard = (w: Worked): Card => ({
  verb: 'setup',
  headline: headline(w),
  parts: parts(w),
  choices: choices(w),
  pictures: setupPictures(w.request, w.result),
  figures: w.result.figures,
  checks: w.result.checks,
  cautions: w.result.cautions,
  alternatives: w.result.alternatives,
  ways: waysOfSetUp(w.request, w.result),
  units: w.said.units ?? w.context.units,
});
