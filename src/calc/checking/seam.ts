import { type CautionId, cautionsFor } from '../caution.ts';
import { type Check, type CheckOf, figure } from '../check.ts';
import { sharpHeight } from '../growth/index.ts';
import {
  LARGEST_DIAMETER,
  type ResolvedPitch,
  resolvePitch,
  type SetupRequest,
} from '../setup/index.ts';
import { FEWEST_TEETH, toothCount, wholeToothDiameter } from '../teeth.ts';
import {
  COUNTED_DOUBT,
  firstBite,
  PROVEN_DOUBT_TEETH,
  TRACKS_WITHIN,
  wheelCheck,
} from '../tracking.ts';
import { type Mm, mm, within } from '../units.ts';
import { blankFigures, knurlable, type WheelOnWork } from './blank.ts';
import { chanceByLabel, seamChance } from './chance.ts';
import { type CheckAlternative, type CheckFigures, checkFigures } from './figures.ts';
import { wholeCount } from './proven.ts';

/** From this gap on the seam is whole as it is. Judgement. */
const SEAM_WHOLE_FROM = 0.95;
/** A gap this small tracks too and is only centred: the window of every count. */
const SEAM_CENTRED_TO = TRACKS_WITHIN;
/** How far a label is off at the worst, the rolling circle left out. Derived from DIN 403. */
const LABEL_OFF = 0.02;
/** Below this the chance that the told diameter tracks is watched. Judgement. */
const CHANCE_FINE = 0.9;
const ALTERNATIVES = 3;

export type SeamReading = {
  /** Odd gap between the last mark and the first, in pitches; 0 reads as 1. */
  readonly gap: number;
  /** The trial was made on scrap, or the marks may stay. */
  readonly scrap: boolean;
  /** Marks counted once round, or null. */
  readonly count: number | null;
};

export type SeamWheel = WheelOnWork & Pick<SetupRequest, 'included'>;

export type SeamKind = 'whole' | 'centres' | 'closes';

export type SeamCheck = {
  readonly figures: CheckFigures;
  readonly checks: readonly Check[];
  readonly cautions: readonly CautionId[];
  /** Smaller blanks that close as well. */
  readonly alternatives: readonly CheckAlternative[];
  readonly kind: SeamKind;
  readonly pitch: ResolvedPitch;
};

type Seam = {
  readonly gap: number;
  readonly kind: SeamKind;
  readonly diameter: Mm;
  /** Pitch the take-off is worked out with: proven where the marks were counted. */
  readonly pitch: Mm;
  /** Teeth that go: gap and whole ones. */
  readonly teethOff: number;
  /** Teeth that must go before the marks are gone; null where they may stay. */
  readonly marksOff: number | null;
  readonly count: number | null;
};

/** Smallest gap + k whose take-off is at least twice the first bite. */
const untilMarksAreGone = (gap: number, pitch: Mm, bite: Mm): number => {
  const needed = (2 * bite) / wholeToothDiameter(1, pitch);
  return gap + Math.max(0, Math.ceil(needed - gap - 1e-9));
};

const kindOf = (gap: number): SeamKind => {
  if (gap >= SEAM_WHOLE_FROM - 1e-9) return 'whole';
  return gap <= SEAM_CENTRED_TO + 1e-9 ? 'centres' : 'closes';
};

const teethThatGo = (kind: SeamKind, gap: number, marksOff: number | null): number => {
  switch (kind) {
    case 'whole':
      return 0;
    case 'centres':
      // The marks lie in the pattern that follows, so they need not go.
      return gap;
    case 'closes':
      return marksOff ?? gap;
  }
};

const readSeam = (of: {
  readonly diameter: Mm;
  readonly reading: SeamReading;
  readonly label: ResolvedPitch;
  readonly bite: Mm;
}): Seam => {
  const { diameter, reading, label } = of;
  const read = within('seam', reading.gap, 0, 1);
  const gap = read === 0 ? 1 : read;
  const expected = toothCount(diameter, label.transverse);
  const count = reading.count === null ? null : wholeCount(reading.count, expected);
  const pitch = count === null ? label.transverse : mm((Math.PI * diameter) / (count - 1 + gap));
  const marksOff = reading.scrap ? null : untilMarksAreGone(gap, pitch, of.bite);
  const kind = kindOf(gap);
  const teethOff = teethThatGo(kind, gap, marksOff);
  return { gap, kind, diameter, pitch, teethOff, marksOff, count };
};

/** Share by which a take-off may be out; at one and the same depth the rolling circle drops out. */
const pitchDoubt = (seam: Seam, label: ResolvedPitch): number => {
  if (seam.count !== null) return PROVEN_DOUBT_TEETH / seam.count;
  if (label.knowledge === 'counted') return COUNTED_DOUBT;
  if (label.knowledge === 'label') return LABEL_OFF;
  return PROVEN_DOUBT_TEETH / toothCount(seam.diameter, label.transverse);
};

const chanceOf = (seam: Seam, label: ResolvedPitch): number => {
  const left = seam.kind === 'whole' ? seam.gap - 1 : 0;
  return seamChance(left, seam.teethOff * pitchDoubt(seam, label));
};

const takeOff = (seam: Seam, teeth: number): Mm => wholeToothDiameter(teeth, seam.pitch);
const lessTeeth = (seam: Seam, teeth: number): Mm => mm(seam.diameter - takeOff(seam, teeth));

const seamCheck = (seam: Seam, chance: number): CheckOf<'seam'> => ({
  name: 'seam',
  state: chance >= CHANCE_FINE ? 'fine' : 'watch',
  reason: seam.kind,
  figures: { gap: figure(seam.gap, '1'), chanceTracks: figure(chance, '1') },
});

const wheelOnSeam = (wheel: SeamWheel, seam: Seam, label: ResolvedPitch) =>
  wheelCheck({
    blankDiameter: seam.diameter,
    teeth: toothCount(seam.diameter, seam.pitch),
    pitch: wheel.pitch,
    knowledge: seam.count === null ? label.knowledge : 'proven',
    setOver: label.setOver,
  });

const smallerOnes = (seam: Seam): readonly CheckAlternative[] =>
  Array.from({ length: ALTERNATIVES }, (_, i) => seam.teethOff + i + 1)
    // A seam that is whole as it is keeps its gap for the next one down.
    .map((off) => (seam.kind === 'whole' ? off - 1 + seam.gap : off))
    .map((off) => ({
      toothCount: seam.count === null ? null : Math.round(seam.count - 1 + seam.gap - off),
      blankDiameter: lessTeeth(seam, off),
    }))
    .filter(({ blankDiameter }) => blankDiameter >= wholeToothDiameter(FEWEST_TEETH, seam.pitch));

/** The next smaller blank that closes: the told one, or the one below where nothing comes off. */
const nextFigures = (seam: Seam) => {
  const off = seam.kind === 'whole' ? seam.gap : seam.teethOff;
  return {
    nextDiameter: lessTeeth(seam, off),
    nextTakeOff: takeOff(seam, off),
    nextToothCount: seam.count === null ? null : Math.round(seam.count - 1 + seam.gap - off),
  };
};

const seamFigures = (wheel: SeamWheel, seam: Seam, label: ResolvedPitch, bite: Mm) => {
  const before = blankFigures(wheel, seam.diameter, label);
  const told = lessTeeth(seam, seam.teethOff);
  const marks = seam.marksOff;
  return checkFigures({
    ...before,
    chanceTracks: chanceOf(seam, label),
    seamLabelChance: chanceByLabel(0, before.countDoubt),
    effectivePitch: seam.count === null ? null : seam.pitch,
    seamTakeOff: takeOff(seam, seam.teethOff),
    seamDiameter: told,
    seamTeethOff: seam.teethOff,
    ...nextFigures(seam),
    marksTakeOff: marks === null ? null : takeOff(seam, marks),
    marksDiameter: marks === null ? null : lessTeeth(seam, marks),
    firstBite: bite,
  });
};

const cautions = (diameter: Mm): readonly CautionId[] =>
  cautionsFor({
    blankDiameter: diameter,
    stickout: null,
    supported: false,
    stockLength: null,
    bore: null,
    fill: null,
    materialFill: null,
    materialGroup: null,
    rotation: null,
    machineTopSpeed: null,
    seamTest: true,
    warmUp: null,
    bending: null,
    ring: null,
    pinHeat: null,
  });

/**
 * How much to turn off so that the seam of a trial turn closes, whatever the wheel's label says.
 *
 *     whole from s = 0.95: nothing;  s ≤ 0.10: s p_t/π;  else (s + k) p_t/π ≥ 2 z1, scrap: k = 0
 *     marks counted: p_eff = π D/(n − 1 + s)
 *     chance that it tracks ≥ 90 % fine, else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | wheel | pitch, pattern and tooth angle, as in a request for a set-up | - | |
 * | D (diameter) | diameter the trial turn was made on | mm | 3 teeth to 500 |
 * | reading | gap s of a pitch (0 reads as 1), whether the marks may stay, marks counted | - | 0 to 1 |
 * | → seamTakeOff, seamDiameter | what comes off and what is left | mm | |
 * | → marksTakeOff, marksDiameter | the same with the marks turned away | mm | |
 * | → effectivePitch | pitch proven by the count, or null | mm | |
 * | → chanceTracks | chance that the told diameter tracks within 0.10 | - | 0 to 1 |
 *
 * Assumes one wheel pressed in at the first turn's infeed, once round by hand with the drive out.
 * A gap of 0.95 or more, or of 0.10 or less, leaves the marks inside the pattern: they may stay.
 *
 * @source seam-test (take-off and effective pitch)
 * @source seam-reading (how well the gap is read)
 * @source first-bite (depth of the marks)
 * @source judgement (whole from 0.95, watch under 90 %)
 * @example seamTest({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, knurlClass: null, included: degrees(90) }, inch(0.995), { gap: 0.3, scrap: false, count: null }).figures.seamTakeOff.value // 0.500504 mm
 * @example seamTest({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, knurlClass: null, included: degrees(90) }, inch(0.995), { gap: 0.3, scrap: true, count: 66 }).figures.effectivePitch.value // 1.21589 mm
 */
export function seamTest(wheel: SeamWheel, diameter: Mm, reading: SeamReading): SeamCheck {
  const label = resolvePitch(wheel);
  knurlable(diameter, label.transverse);
  const bite = firstBite(sharpHeight(label.normal, wheel.included), TRACKS_WITHIN);
  const seam = readSeam({ diameter, reading, label, bite });
  const left = lessTeeth(seam, Math.max(seam.teethOff, seam.marksOff ?? 0));
  const least = wholeToothDiameter(FEWEST_TEETH, seam.pitch);
  if (left < least)
    within('diameter', diameter, mm(least + diameter - left), LARGEST_DIAMETER, 'mm');
  return {
    figures: seamFigures(wheel, seam, label, bite),
    checks: [seamCheck(seam, chanceOf(seam, label)), wheelOnSeam(wheel, seam, label)],
    cautions: cautions(diameter),
    alternatives: smallerOnes(seam),
    kind: seam.kind,
    pitch: label,
  };
}
