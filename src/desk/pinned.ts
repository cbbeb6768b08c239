import {
  approvedOf,
  listStandards,
  type Revision,
  type ShopView,
  settingsOf,
} from '../shop/index.ts';
import type { ShopUnits } from '../words/index.ts';
import type { Command } from './command.ts';
import { lineOf } from './route.ts';

/** A standard that holds, as the shop has it pinned: what to turn to, and the line that shows it. */
export type PinnedStandard = {
  readonly part: string;
  readonly revision: number;
  readonly blankDiameter: Revision['scope']['blank'];
  readonly toothCount: number;
  readonly units: ShopUnits;
  readonly words: string;
};

/** As many as are looked through by thumb. Judgement. */
const MOST = 20;
const SHOW = 'knurl standard show';

/** The approved standards of a shop, the last changed first. */
export const pinnedIn = async (
  view: ShopView,
  fleet: readonly Command[],
): Promise<readonly PinnedStandard[]> => {
  const command = fleet.find(({ path }) => path.join(' ') === SHOW);
  if (command === undefined) return [];
  const { units } = await settingsOf(view);
  const standards = await listStandards(view, { limit: MOST, state: 'approved' });
  return standards.flatMap((standard) => {
    const { part } = standard;
    const revision = approvedOf(standard);
    if (revision === undefined) return [];
    const { blank, toothCount } = revision.scope;
    const words = lineOf(command, { part });
    return [{ part, revision: revision.number, blankDiameter: blank, toothCount, units, words }];
  });
};
