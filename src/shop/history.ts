import { type Reader } from '../store/index.ts';
import type { ShopChange, ShopView } from './view.ts';

export type Subject =
  | 'wheel'
  | 'machine'
  | 'material'
  | 'rule'
  | 'person'
  | 'group'
  | 'setting'
  | 'effect'
  | 'result'
  | 'standard'
  | 'question';
export type Verb = 'added' | 'changed' | 'removed';

export type HistoryLine = {
  readonly at: number;
  /** The id of who did it. */
  readonly by: string;
  readonly subject: Subject;
  readonly subjectId: string;
  readonly verb: Verb;
  /** The content before and after, null where there was none. */
  readonly before: unknown;
  readonly after: unknown;
};

export type Remembered = Pick<HistoryLine, 'subjectId' | 'verb' | 'before' | 'after'>;

/** Rows in one statement. Judgement, as for the lists they belong to. */
const PORTION = 250;

/** Writes down what was changed, by whom, from what to what: in the same change as it. */
export const remember = async (
  change: ShopChange,
  subject: Subject,
  lines: readonly Remembered[],
): Promise<void> => {
  const rows = lines.map((line) => ({
    shop: change.id,
    id: change.db.newId(change.at),
    at: change.at,
    by: change.by,
    subject,
    subject_id: line.subjectId,
    verb: line.verb,
    before: line.before === null ? null : JSON.stringify(line.before),
    after: line.after === null ? null : JSON.stringify(line.after),
  }));
  for (let start = 0; start < rows.length; start += PORTION) {
    await change.db
      .insertInto('history')
      .values(rows.slice(start, start + PORTION))
      .execute();
  }
};

/** What was changed, the newest first: of one thing, or of everything of its kind. */
export const historyOf = async (
  view: ShopView,
  subject: Subject,
  of: { readonly id?: string; readonly limit?: number } = {},
): Promise<readonly HistoryLine[]> => {
  let query = rowsOf(view.db, view.id).where('subject', '=', subject);
  if (of.id !== undefined) query = query.where('subject_id', '=', of.id);
  const rows = await query
    .orderBy('id', 'desc')
    .limit(of.limit ?? 50)
    .execute();
  return rows.map((row) => ({
    at: row.at,
    by: row.by,
    subject,
    subjectId: row.subject_id,
    verb: row.verb as Verb,
    before: content(row.before),
    after: content(row.after),
  }));
};

const rowsOf = (db: Reader, shop: string) =>
  db.selectFrom('history').selectAll().where('shop', '=', shop);

const content = (json: string | null): unknown => (json === null ? null : JSON.parse(json));
