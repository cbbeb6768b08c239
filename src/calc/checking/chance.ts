import { normalShare, normalShareSum } from '../normal.ts';
import { TRACKS_WITHIN } from '../tracking.ts';
import { within } from '../units.ts';

/** Standard deviation of a seam read by eye, in pitches. Judgement. */
export const SEAM_READING_SD = 0.05;

/** How much of the way from 0 to `teeth` lies within the window of a whole count. */
const nearWhole = (teeth: number): number => {
  const whole = Math.floor(teeth);
  const part = teeth - whole;
  return (
    2 * TRACKS_WITHIN * whole +
    Math.min(part, TRACKS_WITHIN) +
    Math.max(0, part - (1 - TRACKS_WITHIN))
  );
};

/**
 * Chance that a blank tracks when its count is known only so far.
 *
 *     share of [δ − Δ, δ + Δ] that lies within 0.10 of a whole number
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | δ (error) | tooth error as predicted | - | -0.5 to 0.5 |
 * | Δ (doubt) | half width of the doubt in teeth | - | ≥ 0 |
 * | → chance | that some whole count fits within 0.10 of a tooth | - | 0 to 1 |
 *
 * Assumes the doubt is spread evenly between its ends.
 *
 * @source wheel-truth (half widths of the doubt)
 * @source window-thresholds (0.10 of a tooth)
 * @example chanceByLabel(0, 1.625) // 0.184615
 * @example chanceByLabel(0.05, 0.1) // 0.75
 */
export function chanceByLabel(error: number, doubt: number): number {
  within('toothError', error, -0.5, 0.5);
  within('countDoubt', doubt, 0, 1e6);
  if (doubt < 1e-9) return Math.abs(error) <= TRACKS_WITHIN + 1e-9 ? 1 : 0;
  return (nearWhole(error + doubt) - nearWhole(error - doubt)) / (2 * doubt);
}

/** Share of e + w below a, e normal and w even between −h and h. */
const blurredShare = (a: number, h: number): number =>
  h < 1e-6
    ? normalShare(a / SEAM_READING_SD)
    : (SEAM_READING_SD / (2 * h)) *
      (normalShareSum((a + h) / SEAM_READING_SD) - normalShareSum((a - h) / SEAM_READING_SD));

/**
 * Chance that a diameter told from a seam tracks.
 *
 *     P(|m + e + w| ≤ 0.10),  e ~ N(0, 0.05²),  w even in ±h
 *     P(m + e + w ≤ a) = σ/(2h) (G((a − m + h)/σ) − G((a − m − h)/σ)),  G(z) = z Φ(z) + φ(z)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | m (left) | tooth error that is left on purpose | - | -0.5 to 0.5 |
 * | h (doubt) | take-off in teeth times the doubt about the pitch | - | ≥ 0 |
 * | → chance | that the told diameter tracks within 0.10 of a tooth | - | 0 to 1 |
 *
 * Assumes the gap is read with a standard deviation of 0.05 and no bias.
 *
 * @source seam-reading (0.05 of a pitch)
 * @source normal-spread (normal spread blurred by an even one)
 * @example seamChance(0, 0) // 0.9545
 * @example seamChance(0, 0.026) // 0.9446
 */
export function seamChance(left: number, doubt: number): number {
  within('toothError', left, -0.5, 0.5);
  within('doubt', doubt, 0, 1e3);
  return blurredShare(TRACKS_WITHIN - left, doubt) - blurredShare(-TRACKS_WITHIN - left, doubt);
}
