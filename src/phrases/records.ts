/** What the programs say that look after the records: npm run migrate, backup, restore. */
export type RecordsPhrases = {
  readonly migrated: (steps: readonly string[]) => string;
  readonly backedUp: (file: string) => string;
  /** With where the records went that were there before, or null. */
  readonly restored: (file: string, setAside: string | null) => string;
  readonly backupUsage: string;
  readonly restoreUsage: string;
  readonly addressWrong: string;
  readonly tooNew: (found: string, known: string) => string;
  readonly unavailable: {
    readonly [R in 'busy' | 'readOnly' | 'full' | 'gone']: string;
  };
  readonly backupFault: {
    readonly [C in
      | 'exists'
      | 'absent'
      | 'notABackup'
      | 'damaged'
      | 'wrongEngine'
      | 'inUse'
      | 'notEmpty']: (file: string) => string;
  };
};
