import { expect } from 'vitest';

/** Less than any length that is ever measured: lets a nothing be a nothing. */
const NOTHING = 1e-100;

/** Asserts that a value agrees with another within a part of it. */
export const near = (value: number, expected: number, share: number): void =>
  expect(Math.abs(value - expected)).toBeLessThanOrEqual(share * Math.abs(expected) + NOTHING);
