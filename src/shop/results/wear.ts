import type { ShopChange, ShopView } from '../view.ts';

/**
 * Parts that a wheel has run more, or fewer where a result was taken back. Its version counts it,
 * so that whoever changes the wheel at the same moment does not write over it.
 *
 * @returns what it has run now, or null where there is no wheel
 */
export const wear = async (
  change: ShopChange,
  wheel: string | null,
  parts: number,
): Promise<number | null> => {
  if (wheel === null || parts === 0) return await partsRun(change, wheel);
  const row = await change.db
    .updateTable('wheel')
    .set((eb) => ({
      // A wheel that was set back to new in between has none of those parts left to give back.
      parts_run: eb
        .case()
        .when('parts_run', '<', -parts)
        .then(0)
        .else(eb('parts_run', '+', parts))
        .end(),
      version: eb('version', '+', 1),
    }))
    .where('shop', '=', change.id)
    .where('id', '=', wheel)
    .returning('parts_run')
    .executeTakeFirst();
  return row?.parts_run ?? null;
};

/** Parts that a wheel has run by now; null where there is none. */
export const partsRun = async (view: ShopView, wheel: string | null): Promise<number | null> => {
  if (wheel === null) return null;
  const row = await view.db
    .selectFrom('wheel')
    .select('parts_run')
    .where('shop', '=', view.id)
    .where('id', '=', wheel)
    .executeTakeFirst();
  return row?.parts_run ?? null;
};
