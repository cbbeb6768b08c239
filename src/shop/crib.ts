import {
  type CribWheel,
  DEFAULT_INCLUDED,
  DEFAULT_WHEEL,
  type Mm,
  mm,
  type Pattern,
  type Pitch,
  type WheelSize,
} from '../calc/index.ts';
import type { Wheel, WheelForm } from './wheels.ts';

/** Bore of a wheel whose own nobody has measured, as a share of its diameter. Judgement. */
const BORE_SHARE = 0.3;

/** The size of a wheel, the usual one where nobody has said. */
export const sizeOf = ({ diameter, face, bore, bevel }: Wheel): WheelSize => {
  const outside = diameter ?? DEFAULT_WHEEL.diameter;
  const usual = DEFAULT_WHEEL.bore < outside / 2 ? DEFAULT_WHEEL.bore : mm(outside * BORE_SHARE);
  return { diameter: outside, face: face ?? DEFAULT_WHEEL.face, bore: bore ?? usual, bevel };
};

/**
 * What a wheel leaves on the work when it is used alone; of a crossed one the points are known,
 * whether they stand in diamonds or in squares is not.
 */
export const leaves = (form: WheelForm): readonly Pattern[] => {
  switch (form) {
    case 'straight':
      return [{ kind: 'straight' }];
    // The work is the mirror of the wheel.
    case 'leftHelical':
      return [{ kind: 'diagonal', hand: 'right' }];
    case 'rightHelical':
      return [{ kind: 'diagonal', hand: 'left' }];
    case 'onePieceRaised':
      return [
        { kind: 'diamond', points: 'sunk' },
        { kind: 'square', points: 'sunk' },
      ];
    case 'onePieceSunk':
      return [
        { kind: 'diamond', points: 'raised' },
        { kind: 'square', points: 'raised' },
      ];
  }
};

/** Whether a wheel, alone, leaves a pattern; a hand that was not said may be either. */
export const canLeave = (form: WheelForm, wanted: Pattern): boolean =>
  leaves(form).some((pattern) => {
    if (pattern.kind !== wanted.kind) return false;
    if (pattern.kind === 'straight' || wanted.kind === 'straight') return true;
    if ('hand' in pattern && 'hand' in wanted) {
      return wanted.hand === null || wanted.hand === pattern.hand;
    }
    return 'points' in pattern && 'points' in wanted && pattern.points === wanted.points;
  });

/** What lies in the crib and can leave a pattern: single wheels, and pairs for a diamond. */
export const cribFor = (wheels: readonly Wheel[], pattern: Pattern): readonly CribWheel[] => {
  const usable = wheels.filter(({ state }) => state === 'good' || state === 'worn');
  const singles = usable
    .filter(({ form }) => canLeave(form, pattern))
    .map((wheel) => cribWheel(wheel, pattern));
  const isPaired = pattern.kind === 'diamond' && pattern.points === 'raised';
  return isPaired ? [...singles, ...pairs(usable, pattern)] : singles;
};

const cribWheel = (wheel: Wheel, pattern: Pattern): CribWheel => ({
  name: wheel.name,
  pattern,
  onePiece: wheel.form === 'onePieceRaised' || wheel.form === 'onePieceSunk',
  pitch: wheel.pitch,
  alongRim: wheel.alongRim,
  teeth: wheel.diameter === null ? null : wheel.teeth,
  proven: wheel.proven,
  helix: wheel.helix,
  included: wheel.included ?? DEFAULT_INCLUDED,
  size: sizeOf(wheel),
  edge: wheel.edge,
});

/**
 * Pairs of a left-hand and a right-hand wheel that are labelled alike. Each has its own grooves to
 * fall back into; the count of one of them is taken for both, so the label must be the same.
 */
const pairs = (wheels: readonly Wheel[], pattern: Pattern): readonly CribWheel[] => {
  const rights = wheels.filter(({ form }) => form === 'rightHelical');
  return wheels
    .filter(({ form }) => form === 'leftHelical')
    .flatMap((left) =>
      rights
        .filter((right) => isLabelledAlike(left, right))
        .map((right) => ({
          ...cribWheel(left, pattern),
          onePiece: false,
          name: `${left.name} + ${right.name}`,
          size: smaller(sizeOf(left), sizeOf(right)),
        })),
    );
};

const isLabelledAlike = (a: Wheel, b: Wheel): boolean =>
  a.pitch !== null && b.pitch !== null && samePitch(a.pitch, b.pitch) && a.alongRim === b.alongRim;

const samePitch = (a: Pitch, b: Pitch): boolean => a.system === b.system && a.value === b.value;

/** The narrower face is the one that both cut; the diameter stays with the count. */
const smaller = (a: WheelSize, b: WheelSize): WheelSize => ({
  ...a,
  face: Math.min(a.face, b.face) as Mm,
});
