import type { FormulaName } from '../../calc/index.ts';
import type { FormulaWords } from './formulaWords.ts';
import { checkFormulas } from './whyOfChecks.ts';
import { loadFormulas } from './whyOfLoad.ts';
import { motionFormulas } from './whyOfMotion.ts';
import { partFormulas } from './whyOfParts.ts';
import { planFormulas } from './whyOfPlan.ts';
import { toothFormulas } from './whyOfTooth.ts';

export const formulaWords: Readonly<Record<FormulaName, FormulaWords>> = {
  ...toothFormulas,
  ...motionFormulas,
  ...loadFormulas,
  ...checkFormulas,
  ...partFormulas,
  ...planFormulas,
};

/** What a formula on the way gives, in a few words. */
const GIVES: Readonly<Partial<Record<FormulaName, string>>> = {
  basisOf: 'what the label measures',
  contactArc: 'contact arc',
  contactModulus: 'modulus of the contact',
  contactWidth: 'width that rolls on the work',
  cutKnurl: 'cutting force',
  equivalentRadius: 'equivalent radius',
  formRatingByNumbers: 'how well it forms',
  formedFlat: 'infeed on flat work',
  giveState: 'how far it may give way',
  growthBeforeResults: 'growth factor before any result',
  growthBelief: 'growth factor by the results of the shop',
  heightFromCrest: 'tooth that the crest speaks for',
  hertzHalfWidth: 'half width of the contact',
  meanWedgeShare: 'mean share that the teeth bear on',
  numberFactor: 'what a number makes of it',
  ordinaryPinHeat: 'an ordinary plunge',
  pinHeat: 'heat on the pin',
  pinSliding: 'sliding speed on the pin',
  profileVariance: 'unevenness of the surface',
  rescueSpoiled: 'count that still goes',
  ringWidth: 'width of tube that shares the load',
  metalPressure: 'pressure under a tooth',
  plasticPressure: 'pressure under a tooth',
  secondMoment: 'second moment of the bar',
  sectionModulus: 'section modulus of the bar',
  sharpHeight: 'sharp height',
  solidShare: 'solid share at a height',
  stressState: 'how much stress it may take',
  toothCount: 'teeth as a real number',
  trailingForce: 'pressure on the part that follows',
  wedgeShare: 'share that the teeth bear on',
  wholeToothDiameter: 'whole-tooth diameter',
  workPitch: 'square to the teeth against round the rim',
};

export const givenBy = (by: FormulaName): string => GIVES[by] ?? '';
