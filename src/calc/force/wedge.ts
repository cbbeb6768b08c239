import type { Form } from '../growth/index.ts';
import { within } from '../units.ts';

/** What one wheel presses: grooves, one family of a raised pattern, all of it, or sunk points. */
export type Press = 'grooves' | 'oneOfPair' | 'crossedRaised' | 'crossedSunk';

/**
 * What one wheel presses of a pattern.
 *
 *     grooves → grooves; raised → one family of a pair, or both from one crossed wheel; sunk → points
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | pair | two wheels, one for each family | - | |
 * | → press | what one wheel presses | - | |
 *
 * Assumes each wheel of a pair presses the same depth.
 *
 * @source force-model (wedge share by kind of wheel)
 * @example pressOf('raised', true) // "oneOfPair"
 */
export function pressOf(form: Form, pair: boolean): Press {
  switch (form) {
    case 'grooves':
      return 'grooves';
    case 'raised':
      return pair ? 'oneOfPair' : 'crossedRaised';
    case 'sunk':
      return 'crossedSunk';
  }
}

/**
 * Share of the ground under a wheel that its teeth bear on.
 *
 *     grooves x;  one of a pair x − x²/2;  crossed, raised 2x − x²;  crossed, sunk x²
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | press | what the wheel presses | - | |
 * | x (fill) | tooth height over sharp height | - | 0 to 1 |
 * | → φ | wedge share | - | 0 to 1 |
 *
 * Assumes sharp teeth and flanks that bear as far down as the work has risen between them.
 *
 * @source force-model (a tooth of height H bears on H/Hf of the pitch)
 * @example wedgeShare('grooves', 0.8) // 0.8
 * @example wedgeShare('oneOfPair', 0.9) // 0.495
 */
export function wedgeShare(press: Press, fill: number): number {
  const x = within('fill', fill, 0, 1);
  switch (press) {
    case 'grooves':
      return x;
    case 'oneOfPair':
      return x - x ** 2 / 2;
    case 'crossedRaised':
      return 2 * x - x ** 2;
    case 'crossedSunk':
      return x ** 2;
  }
}

/**
 * Mean wedge share while a wheel sinks from touch to its whole infeed.
 *
 *     φ̄ = (1/z) ∫₀ᶻ φ dz,  dz = share dH
 *     grooves (x/2 − x²/3)/(1 − x/2);  crossed, sunk (x²/3 − x⁴/5)/(1 − x²/3)
 *     crossed, raised (x − 5x²/3 + x³ − x⁴/5)/(1 − x + x²/3), one of a pair half of it
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | press | what the wheel presses | - | |
 * | x (fill) | tooth height over sharp height at the end | - | 0 to 1 |
 * | → φ̄ | mean over the infeed, not over the height | - | 0 to 1 |
 *
 * Assumes volume is kept, as for the infeed of the pattern.
 *
 * @source force-model (leading part of a wheel that travels)
 * @source volume-constancy (infeed against height)
 * @example meanWedgeShare('grooves', 0.8) // 0.311111
 */
export function meanWedgeShare(press: Press, fill: number): number {
  const x = within('fill', fill, 0, 1);
  const raised = (x - (5 * x ** 2) / 3 + x ** 3 - x ** 4 / 5) / (1 - x + x ** 2 / 3);
  switch (press) {
    case 'grooves':
      return (x / 2 - x ** 2 / 3) / (1 - x / 2);
    case 'oneOfPair':
      return raised / 2;
    case 'crossedRaised':
      return raised;
    case 'crossedSunk':
      return (x ** 2 / 3 - x ** 4 / 5) / (1 - x ** 2 / 3);
  }
}
