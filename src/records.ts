import path from 'node:path';
import { config } from 'dotenv';
import { en } from './phrases/index.ts';
import {
  AddressWrong,
  BackupFault,
  RecordsTooNew,
  type StorePlace,
  StoreUnavailable,
  storePlace,
} from './store/index.ts';

/** Where the records are kept, as the environment and the file .env say. */
export const recordsPlace = (): StorePlace => {
  config({ quiet: true });
  return storePlace(process.env);
};

/** What went wrong with the records, in a sentence; null where it is a fault of the program. */
export const recordsFault = (error: unknown): string | null => {
  const { records } = en;
  if (error instanceof RecordsTooNew) return records.tooNew(error.found, error.known);
  if (error instanceof BackupFault) return records.backupFault[error.code](error.file);
  if (error instanceof AddressWrong) return records.addressWrong;
  if (error instanceof StoreUnavailable) return records.unavailable[error.reason];
  return null;
};

/** Does one thing to the records and says so, or says why it could not. */
export const onRecords = async (work: (place: StorePlace) => Promise<string>): Promise<void> => {
  try {
    process.stdout.write(`${await work(recordsPlace())}\n`);
  } catch (error) {
    const sentence = recordsFault(error);
    if (sentence === null) throw error;
    process.stderr.write(`${sentence}\n`);
    process.exitCode = 1;
  }
};

/** The one argument of a program, or null after saying what it should have been. */
export const argument = (usage: string): string | null => {
  const [file, ...more] = process.argv.slice(2);
  // npm goes to the project's folder first; the person is where they typed it.
  const here = process.env['INIT_CWD'] ?? process.cwd();
  if (file !== undefined && file !== '' && more.length === 0) return path.resolve(here, file);
  process.stderr.write(`${usage}\n`);
  process.exitCode = 2;
  return null;
};
