import type { Form } from './growth/index.ts';
import { degrees, type Rad, rad } from './units.ts';

/** What is to stand on the work, in the trade's words. */
export type Pattern =
  | { readonly kind: 'straight' }
  | { readonly kind: 'diagonal'; readonly hand: 'left' | 'right' | null }
  | { readonly kind: 'diamond'; readonly points: 'raised' | 'sunk' }
  | { readonly kind: 'square'; readonly points: 'raised' | 'sunk' };

export type PatternKind = Pattern['kind'];

/** Helix of diagonal and diamond wheels where nothing else is said: the swivel of DIN 82. */
export const DEFAULT_HELIX: Rad = degrees(30);

/**
 * How the grooves of a pattern meet, which decides where the metal goes.
 *
 *     straight, diagonal → grooves; diamond, square → raised or sunk points
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pattern | pattern on the work | - | |
 * | → form | grooves, raised or sunk | - | |
 *
 * Assumes both groove families of a crossed pattern are cut to the same depth.
 *
 * @source din-82 (forms RAA to RKV)
 * @example formOf({ kind: 'diamond', points: 'raised' }) // "raised"
 */
export function formOf(pattern: Pattern): Form {
  return pattern.kind === 'diamond' || pattern.kind === 'square' ? pattern.points : 'grooves';
}

/**
 * Helix of the teeth on the work where nothing else is said.
 *
 *     ψ = 30° for diagonal and diamond, 0° for straight and square
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pattern | pattern on the work | - | |
 * | → ψ | helix | rad | 0 to 0.5236 |
 *
 * Assumes wheels of the common 30° helix.
 *
 * @source din-82 (30° swivel)
 * @source din-403 (wheel tooth counts give π·d·cos 30°/t)
 * @example usualHelix({ kind: 'diagonal', hand: null }) // 0.523599 rad
 */
export function usualHelix(pattern: Pattern): Rad {
  return pattern.kind === 'diagonal' || pattern.kind === 'diamond' ? DEFAULT_HELIX : rad(0);
}

/**
 * Whether a pattern comes from one crossed wheel, which only plunges.
 *
 *     square: always; diamond: sunk points always, raised ones where one wheel is asked for
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pattern | pattern on the work | - | |
 * | asked | one crossed wheel instead of a pair | - | |
 * | → onePiece | from one crossed wheel | - | |
 *
 * Assumes a pair of helical wheels raises points: sunk ones are pressed by a wheel whose own points are raised.
 *
 * @source din-82 (RGV is made by a GE wheel, RGE by a GV wheel or a pair)
 * @source one-piece-crossed (a crossed wheel plunges only)
 * @example isOnePiece({ kind: 'diamond', points: 'sunk' }, false) // true
 * @example isOnePiece({ kind: 'diamond', points: 'raised' }, false) // false
 */
export function isOnePiece(pattern: Pattern, asked: boolean): boolean {
  if (pattern.kind === 'square') return true;
  return pattern.kind === 'diamond' && (asked || pattern.points === 'sunk');
}

/** The wheel or wheels that form a pattern, as the trade names them. */
export type WheelKind =
  | 'straight'
  | 'leftHelical'
  | 'rightHelical'
  | 'helical'
  | 'helicalPair'
  | 'onePieceRaised'
  | 'onePieceSunk'
  | 'straightSetOver'
  | 'straightPairSetOver';

/**
 * The wheel that forms a pattern: the mirror of it.
 *
 *     left-hand knurl ← right-hand wheel; raised points ← sunk wheel
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pattern | pattern on the work | - | |
 * | onePiece | one crossed wheel instead of a pair | - | |
 * | setOver | straight wheels swivelled instead of helical ones | - | |
 * | → wheel | kind of wheel | - | |
 *
 * Assumes a diamond comes from a pair of helical wheels unless one crossed wheel is asked for.
 *
 * @source din-82 (a left-hand knurl needs a right-hand wheel, raised points an indented wheel)
 * @example wheelFor({ kind: 'diagonal', hand: 'left' }, false, false) // "rightHelical"
 */
export function wheelFor(pattern: Pattern, onePiece: boolean, setOver: boolean): WheelKind {
  switch (pattern.kind) {
    case 'straight':
      return setOver ? 'straightSetOver' : 'straight';
    case 'diagonal':
      if (setOver) return 'straightSetOver';
      if (pattern.hand === null) return 'helical';
      return pattern.hand === 'left' ? 'rightHelical' : 'leftHelical';
    case 'square':
      return pattern.points === 'raised' ? 'onePieceSunk' : 'onePieceRaised';
    case 'diamond':
      if (isOnePiece(pattern, onePiece))
        return pattern.points === 'raised' ? 'onePieceSunk' : 'onePieceRaised';
      return setOver ? 'straightPairSetOver' : 'helicalPair';
  }
}
