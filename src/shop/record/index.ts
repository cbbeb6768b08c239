/** What the shop's own results show. */
export { recordFiles } from './files.ts';
export {
  type RecordedFamily,
  type RecordedPart,
  recordedFamilies,
  recordedParts,
} from './growth.ts';
export {
  type Outcomes,
  outcomesByMaterial,
  outcomesByWheel,
  type StandardUse,
  standardUses,
} from './outcomes.ts';
