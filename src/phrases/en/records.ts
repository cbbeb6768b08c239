import type { RecordsPhrases } from '../records.ts';

export const records: RecordsPhrases = {
  migrated: (steps) =>
    steps.length === 0
      ? 'The records have the form this program wants. Nothing was changed.'
      : `The records were brought to the form this program wants: ${steps.join(', ')}.`,
  backedUp: (file) => `The records are backed up in ${file}.`,
  restored: (file, setAside) =>
    setAside === null
      ? `The records of ${file} are in place.`
      : `The records of ${file} are in place. Those that were there before are kept in ${setAside}.`,
  backupUsage:
    'Say where the backup goes: npm run backup -- records.db (or records.jsonl, which a server can also take in).',
  restoreUsage: 'Say which backup to take in: npm run restore -- records.db',
  addressWrong:
    'DATABASE_URL does not begin with postgres://. Give the address of a PostgreSQL database, or leave it out to keep the records in a file.',
  tooNew: (found, known) =>
    `The records were written by a newer Wholetooth (their form is ${found}, this program knows ${known}). Start the newer program, or restore a backup that was made with this one.`,
  unavailable: {
    busy: 'The records are in use by another program and did not become free. Nothing was changed; try again in a minute.',
    readOnly:
      'The records can be read but not written. Check who may write to the folder or the database, then try again.',
    full: 'There is no room left for the records. Nothing was changed; make room, then try again.',
    gone: 'The records cannot be reached. Check WHOLETOOTH_DATA or DATABASE_URL and that the folder or server is there, then try again.',
  },
  backupFault: {
    exists: (file) => `${file} is there already and is not written over. Choose another name.`,
    absent: (file) => `There is no file ${file}. Check the name.`,
    notABackup: (file) => `${file} is not a backup of Wholetooth's records. Nothing was changed.`,
    damaged: (file) => `${file} is damaged or cut short. Nothing was changed; take another backup.`,
    wrongEngine: (file) =>
      `${file} is a copy of a file, which a server does not take in. Make the backup with a name that ends in .jsonl.`,
    inUse: () => 'The records are in use. Stop the program that uses them, then restore again.',
    notEmpty: () =>
      'The database holds shops already. Restore into an empty one; nothing was changed.',
  },
};
