import { literally } from '../../store/index.ts';
import type { ShopView } from '../view.ts';
import { closeness, outsideOf } from './covers.ts';
import type { Job } from './job.ts';
import { type Revision, readStandard, revisionOf, type Standard } from './standard.ts';

export type Covering = { readonly standard: Standard; readonly revision: Revision };

/** The approved revisions that cover a job: the closest first, of equals the one approved last. */
export const covering = async (view: ShopView, job: Job): Promise<readonly Covering[]> => {
  if (job.base === null) return [];
  const rows = await view.db
    .selectFrom('standard_revision')
    .selectAll()
    .where('shop', '=', view.id)
    .where('state', '=', literally('approved'))
    .where('base', '=', job.base)
    .where('pattern', '=', job.pattern.kind)
    .orderBy('id', 'desc')
    .execute();
  const found: Covering[] = [];
  for (const row of rows) {
    const revision = revisionOf(row);
    if (outsideOf(revision.scope, job).length > 0) continue;
    const standard = await readStandard(view, row.standard);
    if (standard !== undefined) found.push({ standard, revision });
  }
  const near = ({ revision }: Covering): number => closeness(revision.scope, job);
  const since = ({ revision }: Covering): number => revision.approved?.at ?? 0;
  return found.sort((a, b) => near(b) - near(a) || since(b) - since(a));
};
