import { MATERIALS } from './data.ts';
import type { Material } from './material.ts';

export { MATERIALS } from './data.ts';
export type {
  Material,
  MaterialGroup,
  Suits,
  Valued,
} from './material.ts';

/** Taken, and said so, where no material is named. */
export const DEFAULT_MATERIAL_ID = 'steel-medC-CD';

/** Offered where a material is asked for. Judgement: what most shops keep on the rack. */
export const USUAL_MATERIALS: readonly string[] = [
  'steel-lowC-CD',
  'steel-medC-CD',
  'ss303',
  'ss304',
  'al6061-T6',
  'brass360',
];

const BY_ID: ReadonlyMap<string, Material> = new Map(
  MATERIALS.map((material) => [material.id, material]),
);

/**
 * The material of an id, as the table holds it.
 *
 *     material = MATERIALS[id], none where the table has no such id
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | id | id in the table, as spelled there | - | |
 * | → material | row of the table | - | |
 *
 * Assumes the bar is in the condition the row names.
 *
 * @source materials-practice (which rows there are)
 * @source materials-S1 (yield of the example)
 * @example materialById('steel-lowC-CD')?.yield.value // 370
 * @example materialById('no such bar') === undefined // true
 */
export function materialById(id: string): Material | undefined {
  return BY_ID.get(id);
}

/**
 * Whether a material is a plastic, which has no Brinell hardness and springs back.
 *
 *     plastic ⇔ group = plastic
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | group | family the material belongs to | - | |
 * | → plastic | is a plastic | - | |
 *
 * Assumes every plastic of the table stands in the group of that name.
 *
 * @source materials-practice (plastics are cut, not formed)
 * @example isPolymer({ group: 'plastic' }) // true
 * @example isPolymer({ group: 'brass' }) // false
 */
export function isPolymer(material: Pick<Material, 'group'>): boolean {
  return material.group === 'plastic';
}
