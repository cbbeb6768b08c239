import { DEFAULT_HELIX } from '../pattern.ts';
import { type Mm, mm, within } from '../units.ts';

/** Kinds of knurl the standard knows. */
export type JisKind = 'straight' | 'diamond';

/** Modules m of the standard in mm; the pitch is π·m. */
export const JIS_MODULES = [0.2, 0.3, 0.5] as const;

/**
 * Blank diameter for a whole number of teeth, by the standard.
 *
 *     straight D = n m;  diamond D = n m / cos 30°
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | kind | straight or diamond | - | |
 * | n (teeth) | whole number of teeth | - | ≥ 3 |
 * | m (module) | module | mm | > 0 |
 * | → D | diameter of the blank | mm | |
 *
 * Assumes diamond wheels of 30° helix.
 *
 * @source jis-b-0951 (D = n·m and D = n·m/cos 30°)
 * @example jisBlank({ kind: 'diamond', teeth: 60, module: mm(0.3) }) // 20.785 mm
 * @example jisBlank({ kind: 'straight', teeth: 40, module: mm(0.5) }) // 20 mm
 */
export function jisBlank(of: {
  readonly kind: JisKind;
  readonly teeth: number;
  readonly module: Mm;
}): Mm {
  within('teeth', of.teeth, 3, 1e5);
  within('module', of.module, Number.MIN_VALUE, 1000, 'mm');
  const straight = of.teeth * of.module;
  return mm(of.kind === 'straight' ? straight : straight / Math.cos(DEFAULT_HELIX));
}
