/** The records: two engines behind one set of queries. Nothing outside knows either of them. */
export { backup } from './backup.ts';
export { BackupFault, type BackupFaultCode } from './backupFaults.ts';
export { RecordsTooNew, StoreUnavailable, type UnavailableReason } from './faults.ts';
export { enterTerms, leaveTerms, termsIn } from './findIndex.ts';
export { firstIdAt } from './ids.ts';
export { literally } from './literally.ts';
export type { Engine } from './migrations/columns.ts';
export { AddressWrong, type StorePlace, type StoreSettings, storePlace } from './place.ts';
export { portionsOf, type Row } from './portions.ts';
export {
  type RegisterReader,
  type RegisterWriter,
  readRegister,
  type Signature,
  type Written,
  writeRegister,
} from './register.ts';
export { type Restored, restore } from './restore.ts';
export { spellingsOf } from './spellings.ts';
export {
  migrate,
  openStore,
  type Store,
  type StoreOptions,
  type Tx,
} from './store.ts';
export * from './tables.ts';
export type { TransactOptions } from './transact.ts';
export type { Reader, View } from './view.ts';
