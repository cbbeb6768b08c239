export type BackupFaultCode =
  /** There is a file of that name already, and it is not written over. */
  | 'exists'
  /** There is no such file. */
  | 'absent'
  /** The file is something else. */
  | 'notABackup'
  /** The file ends before its end, or what it holds does not fit together. */
  | 'damaged'
  /** A copy of a file of records, to be restored into a server: it needs the form of lines. */
  | 'wrongEngine'
  /** The records to be replaced are in use. */
  | 'inUse'
  /** The server's database holds shops already. */
  | 'notEmpty';

const REASONS: Record<BackupFaultCode, string> = {
  exists: 'There is a file of that name already; it is not written over',
  absent: 'There is no such file',
  notABackup: 'This is not a backup of ours',
  damaged: 'The backup is damaged or cut short; nothing was restored',
  wrongEngine: 'This backup is a copy of a file; for a server make one whose name ends in .jsonl',
  inUse: 'The records are in use; stop the program first',
  notEmpty: 'The database holds shops already; restore into an empty one',
};

/** A backup or a restoration that was not made, and why. What was there before is untouched. */
export class BackupFault extends Error {
  readonly code: BackupFaultCode;
  readonly file: string;

  constructor(code: BackupFaultCode, file: string, cause?: unknown) {
    super(`${REASONS[code]}: ${file}`, { cause });
    this.name = 'BackupFault';
    this.code = code;
    this.file = file;
  }
}
