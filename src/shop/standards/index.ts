export { type BasisChange, changesSince } from './basis.ts';
export { type Covering, covering } from './covering.ts';
export { type Outside, outsideOf } from './covers.ts';
export { approveStandard, proposeStandard, retireStandard } from './decide.ts';
export { type Job, jobOf, type Scope } from './job.ts';
export { notNow } from './judge.ts';
export { keysOf } from './keys.ts';
export { oldestPins, type Pinned } from './pins.ts';
export { type RevisionDraft, type Saving, saveStandard } from './save.ts';
export {
  approvedOf,
  findStandard,
  listStandards,
  openOf,
  partsOf,
  type Revision,
  readStandard,
  type Standard,
  type StandardState,
} from './standard.ts';
export type { StandardWith } from './write.ts';
