/**
 * Worked examples for spindle speed, feed window and time, computed independently of src/calc, six
 * significant digits. Speeds in m/min, lengths in mm, feeds in mm/rev, times in s.
 */

/** E1 */
export const SPINDLE_SPEED = { speed: 25, diameter: 20, rotation: 397.887 } as const;

/** E2: contact width 8, pitch 1.0. */
export const FEED_WINDOWS = [
  { hardening: 'low', width: 8, pitch: 1.0, low: 0.4, high: 0.76, open: true },
  { hardening: 'high', width: 8, pitch: 1.0, low: 0.8, high: 0.76, open: false },
] as const;

/** E3: over a path of 30, nothing run off its end. */
export const TRAVERSE = { length: 30, feed: 0.4, rotation: 397.887, time: 11.3097 } as const;
