import {
  type Candidate,
  type CribWheel,
  cribPitch,
  DEFAULT_INCLUDED,
  type FamilyGrowth,
  type Figures,
  figure,
  type Pitch,
  type Plan,
  type PlanChange,
  type RemedyKind,
  type SetupRequest,
  STANDING_CAUTIONS,
  type Way,
  type Window,
} from '../../src/calc/index.ts';
import {
  type CandidateSaid,
  type Card,
  type Choice,
  type Line,
  label,
  line,
  type Row,
  row,
} from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import { planPictures } from './pictures.ts';
import type { CribKind, PlanWords } from './planFields.ts';
import { cribLine } from './shopCrib.ts';
import { growthLines } from './shopGrowth.ts';
import { reworded } from './words.ts';

type Planned = {
  readonly context: Context;
  readonly given: PlanWords;
  readonly request: SetupRequest;
  readonly limits: Window;
  readonly kind: CribKind;
  readonly crib: readonly CribWheel[];
  readonly plan: Plan;
  /** What the shop has seen of the growth of such a part. */
  readonly growth: FamilyGrowth | null;
};

/** Candidates told on the card; programs get all of them. */
const SHOWN = 5;

const asSaid = (candidate: Candidate): CandidateSaid => {
  const { wheel, toothCount, blankDiameter, fill, process } = candidate;
  const { chanceTracks, chanceLands, limitedBy, state } = candidate;
  return {
    wheel: wheel.name,
    toothCount,
    blankDiameter,
    fill,
    process,
    chanceTracks,
    chanceLands,
    limitedBy,
    state,
  };
};

const changeLine = (change: PlanChange): Line => {
  const candidate = asSaid(change.candidate);
  switch (change.kind) {
    case 'offMiddle':
      return line('planOffMiddle', {});
    case 'remedy':
      return line('planRemedy', { ...change.remedy, candidate });
    case 'widerLimits':
      return line('planWider', { ...change, candidate });
    case 'otherPitch':
      return line('planOtherPitch', { pitch: cribPitch(change.candidate.wheel).normal, candidate });
    case 'cut':
      return line('planCut', candidate);
  }
};

const pitchWords = (pitch: Pitch): string => {
  switch (pitch.system) {
    case 'metric':
      return `${String(pitch.value)} pitch`;
    case 'tpi':
      return `${String(pitch.value)}tpi`;
    case 'dp':
      return `${String(pitch.value)}dp`;
    case 'module':
      return `module ${String(pitch.value)}`;
  }
};

/** Words that the candidate's own take the place of. */
const REPLACED = ['pitch', 'wheel', 'bevel', 'edge', 'oneWheel', 'angle', 'process', 'tolerance'];

/** A diamond that no single wheel leaves comes from two, which have no record of their own. */
const isPair = ({ wheel }: Candidate): boolean =>
  wheel.pattern.kind === 'diamond' && !wheel.onePiece;

const wheelWords = (kind: CribKind, candidate: Candidate): string => {
  const { wheel } = candidate;
  // By its name the shop's wheel comes with all that is known of it.
  if (kind === 'ofShop' && !isPair(candidate)) return `wheel ${wheel.name}`;
  const { diameter, face, bore, bevel } = wheel.size;
  const size = [diameter, face, bore].map((each) => String(Number(each.toFixed(4)))).join('x');
  return [
    wheel.pitch === null ? '' : pitchWords(wheel.pitch),
    `wheel ${size} mm`,
    wheel.teeth === null ? '' : `${String(wheel.teeth)} teeth`,
    bevel === null ? '' : `bevel ${String(Number(bevel.toFixed(4)))} mm`,
  ]
    .filter((part) => part !== '')
    .join(' ');
};

const degreesOf = (angle: number): string => String(Math.round((angle * 180) / Math.PI));

/** The line that works this candidate out in full. */
const setupWords = (
  p: Planned,
  candidate: Candidate,
  without: readonly string[] = [],
  besides = '',
): string => {
  const { wheel, process, toothCount, fill } = candidate;
  const more = [
    wheelWords(p.kind, candidate),
    // The word first: behind a wheel's size the number would be the wheel's own teeth.
    `teeth ${String(toothCount)}`,
    `fill ${String(Number((fill * 100).toFixed(2)))}%`,
    wheel.onePiece && p.request.pattern.kind === 'diamond' ? 'one wheel' : '',
    wheel.included === DEFAULT_INCLUDED ? '' : `angle ${degreesOf(wheel.included)}`,
    process === 'cut' ? 'cut' : '',
    besides,
  ].filter((part) => part !== '');
  return reworded(p.context, [...REPLACED, ...without], more.join(' ')).replace(
    /^(?:\/?knurl\s+)?plan\b/iu,
    '/knurl',
  );
};

const passes = (candidate: Candidate): boolean => candidate.state !== 'stop';

/**
 * What the card lists. A crest inside the limits but off their middle is still a part that passes:
 * where nothing meets the middle, it is the answer, and says so.
 */
const listed = ({ plan }: Planned): readonly Candidate[] => {
  if (plan.candidates.some(passes)) return plan.candidates;
  const offMiddle = plan.changes.flatMap((change) =>
    change.kind === 'offMiddle' ? [change.candidate] : [],
  );
  return [...offMiddle, ...plan.candidates];
};

const bestOf = (p: Planned): Candidate | undefined => listed(p).find(passes);
const isOffMiddle = (p: Planned): boolean =>
  p.plan.changes.some((change) => change.kind === 'offMiddle' && change.candidate === bestOf(p));

const otherChanges = ({ plan }: Planned): readonly PlanChange[] =>
  plan.changes.filter((change) => change.kind !== 'offMiddle');

const headline = (p: Planned): Line => {
  const best = bestOf(p);
  if (best !== undefined) return line('planBest', asSaid(best));
  // Where nothing passes, the smallest change that would is what can be acted on.
  const [change] = otherChanges(p);
  return change === undefined ? line('planNone', { limits: p.limits }) : changeLine(change);
};

const lookedThrough = (kind: CribKind, crib: readonly CribWheel[]): Line =>
  kind === 'oneWheel' ? line('planCribOneWheel', {}) : cribLine({ kind, crib });

const firstLines = (p: Planned): readonly Line[] => [
  ...(bestOf(p) === undefined && otherChanges(p).length > 0
    ? [line('planNone', { limits: p.limits })]
    : []),
  line('planFor', { limits: p.limits, wheels: p.plan.fittingWheels }),
  ...(isOffMiddle(p) ? [line('planOffMiddle', {})] : []),
  lookedThrough(p.kind, p.crib),
];

/** The changes that the headline does not tell already. */
const changesBelow = (p: Planned): readonly PlanChange[] =>
  bestOf(p) === undefined ? otherChanges(p).slice(1) : otherChanges(p);

const candidateRows = (p: Planned): readonly Row[] =>
  listed(p)
    .slice(0, SHOWN)
    .map((candidate, index) => row('candidate', { ...asSaid(candidate), place: index + 1 }));

/** What a remedy's words take the place of. */
const REMEDY_REPLACES: { readonly [K in RemedyKind]: readonly string[] } = {
  stickout: ['stickout'],
  tailstock: ['support'],
  moreTurns: ['turns', 'feed'],
  slower: ['speed', 'rotation'],
  narrowerWheel: [],
  plug: ['plug'],
  opposed: ['layout'],
  cut: [],
};

/** A change as the line that works it out: its candidate in full, or the plan once more. */
const changeChoice = (p: Planned, change: PlanChange): readonly Choice[] => {
  const { candidate } = change;
  const { toothCount } = candidate;
  const words = setupWords(p, candidate);
  switch (change.kind) {
    case 'offMiddle':
      return [];
    case 'remedy': {
      const { kind, number, words: more } = change.remedy;
      const said = kind === 'narrowerWheel' || kind === 'cut' ? '' : more;
      return [
        {
          label: label('candidateWith', { kind, number, toothCount }),
          words: setupWords(p, candidate, REMEDY_REPLACES[kind], said),
        },
      ];
    }
    case 'widerLimits':
      return [{ label: label('planWith', change), words: widerWords(p, change.limits) }];
    case 'otherPitch': {
      const pitch = cribPitch(candidate.wheel).normal;
      return [{ label: label('otherPitch', { pitch, toothCount }), words }];
    }
    case 'cut':
      return [{ label: label('candidateCut', { toothCount }), words }];
  }
};

/** The plan once more with limits that let something pass, rounded outward. */
const widerWords = (p: Planned, { low, high }: Window): string => {
  const scale = 1000;
  const [from, to] = [Math.floor(low * scale) / scale, Math.ceil(high * scale) / scale];
  return reworded(p.context, ['finish'], `finish ${String(from)}-${String(to)} mm`);
};

const choices = (p: Planned): readonly Choice[] => [
  ...(bestOf(p) === undefined ? otherChanges(p).flatMap((each) => changeChoice(p, each)) : []),
  ...candidateChoices(p),
];

const candidateChoices = (p: Planned): readonly Choice[] =>
  listed(p)
    .slice(0, SHOWN)
    .map((candidate, index) => ({
      label: label('candidate', {
        place: index + 1,
        wheel: candidate.wheel.name,
        toothCount: candidate.toothCount,
      }),
      words: setupWords(p, candidate),
    }));

const figuresOf = (best: Candidate | undefined): Figures => ({
  toothCount: best === undefined ? null : figure(best.toothCount, '1'),
  blankDiameter: best === undefined ? null : figure(best.blankDiameter, 'mm'),
  fill: best === undefined ? null : figure(best.fill, '1'),
  crestDiameter: best === undefined ? null : figure(best.crestDiameter, 'mm'),
  chanceTracks: best === undefined ? null : figure(best.chanceTracks, '1'),
  chanceLands: best === undefined ? null : figure(best.chanceLands, '1'),
});

const waysOfPlan = ({ request }: Planned, best: Candidate | undefined): readonly Way[] => [
  ...(best?.process === 'cut' ? (['cut'] as const) : []),
  ...(request.growth.results > 0 ? (['growthLearned'] as const) : []),
];

/** The plan: the best first, what limits each, and what would pass where nothing does. */
export const planCard = (p: Planned): Card => {
  const best = bestOf(p);
  return {
    verb: 'plan',
    headline: headline(p),
    parts: [
      { part: 'lines', lines: firstLines(p) },
      { part: 'lines', lines: changesBelow(p).map(changeLine) },
      { part: 'rows', rows: candidateRows(p) },
      { part: 'checks', checks: best?.checks ?? [] },
      { part: 'lines', lines: growthLines(p.growth, p.request, best?.process ?? 'form') },
      { part: 'cautions', shown: [], rest: [], all: STANDING_CAUTIONS },
      { part: 'footing' },
    ],
    choices: choices(p),
    pictures: planPictures(p.request, p.limits, listed(p)),
    figures: figuresOf(best),
    checks: best?.checks ?? [],
    cautions: STANDING_CAUTIONS,
    alternatives: [],
    ways: waysOfPlan(p, best),
    lists: { candidates: listed(p).map(asSaid) },
    units: p.given.units ?? p.context.units,
  };
};
