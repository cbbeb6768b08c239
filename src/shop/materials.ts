import { materialById } from '../calc/index.ts';
import type { Refusal, Use } from '../refusal.ts';
import { cardsUsing } from './cardUses.ts';
import { type Range, rangeFault } from './limits.ts';
import { cleaned, LONGEST_TEXT, textFault } from './names.ts';
import type { Register } from './register.ts';
import { rulesFor } from './ruleUses.ts';
import type { ShopView } from './view.ts';

/** The shop's own name for a material, and what it knows better of its own bars. */
export type ShopMaterial = {
  readonly name: string;
  /** The row of the table of materials that it is a case of. */
  readonly base: string;
  /** Brinell, as measured. */
  readonly hardness: number | null;
  /** Per cent, as on the certificate. */
  readonly elongation: number | null;
  readonly note: string | null;
};

/** Brinell from soft plastic-like alloys to fully hard steel; elongation as certificates give it. */
const RANGES = {
  hardness: [10, 700, 'HB'],
  elongation: [0, 100, '%'],
} as const satisfies Record<string, Range>;

const fault = (material: ShopMaterial): Refusal | null => {
  if (materialById(material.base) === undefined) {
    return { code: 'notFound', what: 'material', nearest: [] };
  }
  const note = material.note === null ? null : cleaned(material.note);
  return (
    rangeFault(RANGES, material) ?? (note === null ? null : textFault('note', note, LONGEST_TEXT))
  );
};

const uses = async (view: ShopView, id: string, most: number): Promise<readonly Use[]> => {
  const rules = await rulesFor(view, 'material', id, most);
  return [...rules, ...(await cardsUsing(view, 'material', id, most))].slice(0, most);
};

export const MATERIALS_OF_SHOP: Register<'material', ShopMaterial> = {
  subject: 'material',
  fault,
  uses,
  toRow: (material) => ({
    base: material.base,
    hardness: material.hardness,
    elongation: material.elongation,
    note: material.note === null ? null : cleaned(material.note),
  }),
  fromRow: ({ name, base, hardness, elongation, note }) => ({
    name,
    base,
    hardness,
    elongation,
    note,
  }),
};
