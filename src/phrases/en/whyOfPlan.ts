import type { FormulaWords } from './formulaWords.ts';

/** A plan, and the causes of a trouble. */
export const planFormulas = {
  plan: {
    says: "From the print's limits to set-ups: every wheel and whole count that brings the crest to the middle of the limits, ranked by the chance that it tracks and lands.",
    assumes:
      'Assumes the operator brings the crest to the middle of the limits by measuring, and that the two chances are independent.',
  },
  chanceOfTracking: {
    says: 'Chance that a part turned to a whole count tracks on that count.',
    assumes:
      'Assumes a normal error; a pattern that happens to close on another count is not counted.',
  },
  chanceOfLanding: {
    says: 'Chance that the crest can be brought where it is wanted with a fill that is neither too shallow nor too full.',
    assumes: 'Assumes the crest is brought there by measuring, so that only the fill gives way.',
  },
  chanceOfTurning: {
    says: "Chance that a turned diameter lies inside limits, which is all a cut knurl's crest depends on.",
    assumes: 'Assumes a normal error about the diameter turned to.',
  },
  rankCauses: {
    says: 'Causes of a symptom, the likeliest first, each with what spoke for it and one next move.',
    assumes: 'Assumes one cause at a time, and numbers that speak independently of each other.',
  },
  numberFactor: {
    says: 'How much likelier a number makes a cause.',
    assumes: 'Assumes what the work stands is spread normally about the limit.',
  },
  learnedPrior: {
    says: 'How likely each cause is for a symptom in this shop, before a number has spoken.',
    assumes: 'Assumes the first guess is worth twelve results.',
  },
} as const satisfies Record<string, FormulaWords>;
