import type { FormulaWords } from './formulaWords.ts';

/** How each check ends. */
export const checkFormulas = {
  trackingCheck: {
    says: 'Whether the pattern meets itself after one turn.',
    assumes: "Assumes the label's pitch is true.",
  },
  countDoubt: {
    says: 'How far the predicted count may be out, in teeth.',
    assumes: 'Assumes the doubt is spread evenly between its ends.',
  },
  wheelCheck: {
    says: "Whether the wheel's pitch is known well enough to trust the count.",
    assumes: "Assumes a DP wheel's correction holds for unswivelled wheels only.",
  },
  runoutCheck: {
    says: 'Whether a bar that runs out still bites all the way round on its first turn.',
    assumes: 'Assumes the reading is twice the eccentricity.',
  },
  fillCheck: {
    says: 'Whether the tooth is full enough and not too full.',
    assumes: 'Assumes a wheel with sharp teeth.',
  },
  formedFeedCheck: {
    says: 'Whether the feed of a formed traverse gives each spot its turns.',
    assumes: 'Assumes one pass.',
  },
  edgeCheck: {
    says: "Whether the wheel's edges suit the way it goes.",
    assumes: 'Assumes a cut knurl is made by square-edged wheels that travel.',
  },
  formRatingByNumbers: {
    says: 'How well a metal takes forming, by what it stretches and how hard it is.',
    assumes: 'Assumes a metal without a problem of its own (lead, porosity, galling).',
  },
  materialCheck: {
    says: 'Whether the material suits the way it is to be knurled.',
    assumes: 'Assumes the rating of the table where nothing is measured.',
  },
  speedCheck: {
    says: 'Whether the work runs slowly enough.',
    assumes: 'Assumes slower than the band does no harm.',
  },
  finishCheck: {
    says: "Whether the crest, and its 80 % spread, lie inside the print's limits.",
    assumes: 'Assumes a crest that was measured has no spread.',
  },
  pinHeatCheck: {
    says: 'Whether the pin stands the heat of the cut.',
    assumes: 'Assumes a cold wheel: it stands for seconds what it would not stand for long.',
  },
  pinPressureCheck: {
    says: 'Whether the pin stands the pressure of the wheel.',
    assumes: 'Assumes a hardened pin and a hardened bore.',
  },
  stressState: {
    says: 'Verdict on a stress that follows from a force known to a factor of 2.',
    assumes: 'Assumes stress goes with the force.',
  },
  giveState: {
    says: 'Verdict on how far the work gives way, the force being known to a factor of 2.',
    assumes: 'Assumes the give goes with the force.',
  },
  bendingCheck: {
    says: 'Whether the bar stands the push of the wheels, straight enough and without staying bent.',
    assumes: 'Assumes opposed wheels push the bar nowhere.',
  },
  ringCheck: {
    says: 'Whether a tube stands the pinch of the wheels, round enough and without being crushed.',
    assumes:
      'Assumes a thin ring; of a thick one the figures are too rough to trust, and the check says so.',
  },
  stickoutCheck: {
    says: 'Whether the bar sticks out too far to be left without support.',
    assumes: 'Assumes a tailstock or centres are the support that is wanted.',
  },
  widthCheck: {
    says: 'Whether the knurl is no wider than the work is thick.',
    assumes: 'Assumes nothing of how the work is held.',
  },
  capacityCheck: {
    says: 'Whether the machine can turn the work against the wheels.',
    assumes: 'Assumes the limits are those at the spindle.',
  },
  pressFit: {
    says: 'How a knurled part presses into a bore: interference on each side against the tooth height.',
    assumes: 'Assumes the softer of the two parts gives way round the teeth.',
  },
} as const satisfies Record<string, FormulaWords>;
