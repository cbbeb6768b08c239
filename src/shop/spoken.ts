import { readRegister } from '../store/index.ts';
import { partsOf } from './standards/index.ts';
import type { ShopView } from './view.ts';

/** Names the shop has given to things, as far as a line may use them. */
export type SpokenNames = {
  readonly wheels: readonly string[];
  readonly machines: readonly string[];
  readonly materials: readonly { readonly name: string; readonly base: string }[];
  /** Part numbers that have a standard, the ones last changed first. */
  readonly standards: readonly string[];
};

export const spokenNames = async (view: ShopView): Promise<SpokenNames> => {
  const { db, id } = view;
  const materials = await readRegister(db, 'material', id).list();
  return {
    wheels: await readRegister(db, 'wheel', id).names(),
    machines: await readRegister(db, 'machine', id).names(),
    materials: materials.map(({ name, base }) => ({ name, base })),
    standards: await partsOf(view),
  };
};
