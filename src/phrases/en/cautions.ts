import type { Book } from '../book.ts';

export const cautions: Book['cautions'] = {
  guardInPlace: 'Guard in place.',
  noLooseClothing: 'No gloves, loose sleeves, rings or lanyards.',
  eyeProtection: 'Eye protection on.',
  keyOut: 'Key out of the chuck.',
  stopToMeasure: 'Spindle stopped before you measure, brush or adjust.',
  oilFromOutgoingSide:
    'Oil pins and wheels from the outgoing side; no rag or brush at the closing nip.',
  supportBar: 'The bar sticks out far: bring up the tailstock or shorten it.',
  forceUncertain: 'The force is an estimate, good to a factor of two: start light and watch.',
  barBehindSpindle: 'Bar behind the spindle whips: sleeve it or cut it shorter.',
  flaking: 'This one flakes when over-filled: stop while the crests keep a flat.',
  hotPin: 'The wheel pin gets hot: flood it and let it cool between parts.',
  chuckSpeed: "Fast for a chuck: check the chuck's own speed limit first.",
  fireChips:
    'Chips of this metal burn: keep them cleared, a class D extinguisher at hand, no water.',
  tubePinch: 'Thin wall: the wheels squeeze it oval; plug the bore.',
  handTurn: 'Seam test by hand: drive out, power off, one wheel.',
};

/** All six standing cautions, short enough to be read every time. */
export const standing =
  'Guard in place, eyes covered, key out; no gloves, loose sleeves or rings. Spindle stopped before you measure. Oil pins and wheels from the outgoing side.';
