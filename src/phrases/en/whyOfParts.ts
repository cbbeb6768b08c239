import type { FormulaWords } from './formulaWords.ts';

/** A blank, a seam and a finished part. */
export const partFormulas = {
  checkBlank: {
    says: 'Whether a blank as it is will track, and the next smaller diameter that does.',
    assumes: 'Assumes a turned bar cannot be made larger.',
  },
  chanceByLabel: {
    says: 'Chance that a blank tracks when its count is known only so far.',
    assumes: 'Assumes the doubt is spread evenly between its ends.',
  },
  seamTest: {
    says: "How much to turn off so that the seam of a trial turn closes, whatever the wheel's label says.",
    assumes:
      "Assumes one wheel pressed in at the first turn's infeed, once round by hand with the drive out. A gap of 0.95 or more, or of 0.10 or less, leaves the marks inside the pattern: they may stay.",
  },
  seamChance: {
    says: 'Chance that a diameter told from a seam tracks.',
    assumes: 'Assumes the gap is read with a standard deviation of 0.05 and no bias.',
  },
  checkAfter: {
    says: 'Whether a finished part is right, which of count, fill and growth is off, and what to do now.',
    assumes: 'Assumes the crest is read to 0.01 mm, the height to 0.01 mm, the flat to 0.02 mm.',
  },
  measuredGrowthShare: {
    says: 'Share of the static growth that a finished part shows.',
    assumes:
      'Assumes a sharp wheel; the growth is that of the tooth that was measured, not of the one planned.',
  },
  partChecks: {
    says: 'The checks a finished part can be put to, as far as it was measured.',
    assumes: 'Assumes a pattern with nearly twice its teeth has doubled.',
  },
  rescueSpoiled: {
    says: 'The next smaller blank that a spoiled part can still be turned to.',
    assumes: 'Assumes the growth that is expected of the next part.',
  },
  fadeAlong: {
    says: 'What flats of different width along a knurl say of the infeed, and the angle to swivel.',
    assumes: 'Assumes a wheel with sharp tips and a bar that gives way most at its far end.',
  },
} as const satisfies Record<string, FormulaWords>;
