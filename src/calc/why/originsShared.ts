import type { Origins, Worked } from './origin.ts';

/** Figures that set-up and check work out alike. */

export const PITCH: Origins = [
  {
    when: ['proven'],
    by: 'provenPitch',
    through: { p: 'workPitch' },
    given: { D: 'provenDiameter', N: 'provenCount', ψ: 'helix' },
  },
  {
    when: ['counted'],
    by: 'countedWheelPitch',
    through: { p: 'workPitch' },
    given: { D_w: 'wheelDiameter', N_w: 'wheelTeeth', ψ: 'helix' },
  },
  {
    by: 'labelledPitch',
    through: { t: 'basisOf', p: 'workPitch' },
    given: { TPI: 'label', DP: 'label', m: 'label', ψ: 'helix' },
  },
];

export const TRANSVERSE_PITCH: Origins = [
  {
    when: ['proven'],
    by: 'provenPitch',
    given: { D: 'provenDiameter', N: 'provenCount' },
  },
  { by: 'workPitch', inputs: { p: 'pitch' }, given: { ψ: 'helix' } },
];

export const WINDOW: Origins = [
  {
    when: ['classCalled'],
    by: 'classBlankTolerance',
    through: { D: 'wholeToothDiameter' },
    inputs: { N: 'toothCount', p_t: 'transversePitch' },
  },
  {
    by: 'trackingWindow',
    through: { D: 'wholeToothDiameter' },
    inputs: { N: 'toothCount', p_t: 'transversePitch' },
  },
];

export const GROWTH_FACTOR: Origins = [
  { when: ['growthLearned'], by: 'growthBelief' },
  { by: 'growthBeforeResults' },
];

export const FILL: Origins = [
  { when: ['fillAsked'], told: 'person' },
  {
    when: ['fillForPrint'],
    by: 'chooseBlank',
    parts: ['crest outside them: x from 0.70 to 0.92 at which it comes nearest their middle'],
  },
  { by: 'startingFill' },
];

/** Infeed and growth of a tooth that is pushed up, on round work. */
export const FORMED = {
  through: {
    z: ['formedFlat', 'z = ∫₀ᴴ share du'],
    share: 'solidShare',
    's²': ['profileVariance', 's² = 2 ∫₀ᴴ u·share du − z²'],
  },
  given: { u: 'heightInGroove', β: 'tipFlat' },
} as const satisfies Pick<Worked, 'through' | 'given'>;

/** The crest and the ends of its spread. */
export const FORMED_CREST = {
  by: 'makeTooth',
  parts: ['formed: Do = D + ḡ growth(H), its 80 % spread D + (ḡ ± 1.2816 sd) growth(H)'],
} as const satisfies Worked;
