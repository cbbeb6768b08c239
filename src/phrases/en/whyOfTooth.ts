import type { FormulaWords } from './formulaWords.ts';

/** Pitch, count, blank, tooth and growth. */
export const toothFormulas = {
  labelledPitch: {
    says: 'The pitch a label names, as a length, in whatever direction its system measures.',
    assumes: 'Assumes the label is true; a counted wheel is better.',
  },
  basisOf: {
    says: "Which direction a system's pitch is measured in when nothing is said.",
    assumes: 'Assumes helical wheels labelled as their standards define the pitch.',
  },
  workPitch: {
    says: 'Pitch on the work, square to the tooth and round the rim.',
    assumes: "Assumes the wheel's axis lies in the plane through the work's axis and the contact.",
  },
  countedWheelPitch: {
    says: 'Rim pitch of a wheel that was counted and measured: the truth about it, whatever its label.',
    assumes: 'Assumes the wheel rolls on its outside diameter.',
  },
  provenPitch: {
    says: 'Pitch that a diameter and the count which tracked on it have proven.',
    assumes: 'Assumes the pattern met itself, so the count is whole to about 0.1 of a tooth.',
  },
  toothCount: {
    says: 'Teeth that fit round the work, as a real number.',
    assumes: 'Assumes the wheel rolls on the blank without slip at first touch.',
  },
  toothError: {
    says: 'How far a blank is from a whole number of teeth.',
    assumes: 'Assumes the wheel rolls on the blank without slip at first touch.',
  },
  largestWholeCount: {
    says: 'Largest whole count on a bar that can only be turned smaller.',
    assumes: 'Assumes a count within 1e-9 of whole is whole.',
  },
  wholeToothDiameter: {
    says: 'Diameter at which a whole number of teeth fits round the work.',
    assumes: 'Assumes the wheel rolls on the blank without slip at first touch.',
  },
  chooseBlank: {
    says: 'The blank to turn: the bar as it is, the largest whole count under it, or what the print needs.',
    assumes:
      'Assumes a turned bar cannot be made larger, and that a fill which was asked for stays.',
  },
  trackingWindow: {
    says: 'Diameters round a whole-tooth blank that still track.',
    assumes:
      "Assumes the label's pitch is true; the check on the wheel says how far to trust that.",
  },
  classBlankTolerance: {
    says: 'Blank tolerance that a class of diametral-pitch knurl allows, either side of the nominal blank.',
    assumes: 'Assumes Class II blanks are held as Class I.',
  },
  sharpHeight: {
    says: 'Height at which the flanks of a tooth would meet in an edge.',
    assumes: 'Assumes straight flanks of equal slope.',
  },
  heightOfFill: {
    says: 'Height of a tooth that is filled to a share of its sharp height.',
    assumes: 'Assumes the fill is meant of the height, not of the volume.',
  },
  startingFill: {
    says: 'The fill to start with, as a share of the sharp height.',
    assumes: 'Assumes a counted wheel has sharp teeth on its outside diameter.',
  },
  makeTooth: {
    says: 'Height, infeed and crest of a tooth on a real blank: exact on round work when formed, the tooth itself when cut.',
    assumes:
      "Assumes the shop's own share of the static growth, or what is expected before it has results.",
  },
  solidShare: {
    says: 'Share of the surface that is solid at a height above the groove root.',
    assumes: 'Assumes two groove families of one depth that cross at any angle, or one family.',
  },
  formedFlat: {
    says: 'Infeed, rise and growth of a formed knurl on work so large that it counts as flat.',
    assumes:
      "Assumes that volume is kept and that the groove is the wheel's tooth, not swept wider by rolling.",
  },
  profileVariance: {
    says: 'Mean square of the knurled surface about its own mean height, which is all that round work adds.',
    assumes: 'Assumes a sharp wheel and that the shares of round work are those of flat work.',
  },
  formedRound: {
    says: 'Infeed, crest diameter and growth of a formed knurl on round work, exact.',
    assumes: 'Assumes that volume is kept, that no metal flows along the work, and a sharp wheel.',
  },
  heightFromCrest: {
    says: 'Tooth height that a crest diameter on a known blank speaks for, as if volume alone ruled.',
    assumes:
      'Assumes that volume is kept and static growth: a measured growth is divided by its factor first.',
  },
  crestFlat: {
    says: 'Flat left on a crest that is not filled to an edge.',
    assumes: 'Assumes a wheel with sharp tips.',
  },
  cutKnurl: {
    says: 'Crest, infeed, chip and forces of a knurl that is cut instead of formed.',
    assumes:
      'Assumes sharp, square-edged wheels that travel, and work so large that it counts as flat.',
  },
  growthBeforeResults: {
    says: 'The share of static growth to expect before a shop has logged anything.',
    assumes: 'Assumes shop, family and part vary independently and normally.',
  },
  growthBelief: {
    says: "The share of static growth to expect of the next part of a family, from all the shop's results.",
    assumes:
      'Assumes shop, family and part vary independently and normally, with the spreads named in this file.',
  },
  firstBite: {
    says: 'Infeed of the first turn from which the tip falls back into its own first groove.',
    assumes:
      'Assumes each groove family is cut by its own wheel, so the straight relation holds for all.',
  },
  firstCutBite: {
    says: 'Infeed of the first turn of a knurl that is cut, as deep as the groove it has to fall back into.',
    assumes: 'Assumes a cut takes away what a form pushes up, so nothing rises beside the groove.',
  },
} as const satisfies Record<string, FormulaWords>;
