/** Hours in which nobody is rung, from one minute of the day to another, past midnight or not. */
export type QuietHours = { readonly from: number; readonly to: number };

const MINUTE_MS = 60_000;
export const MINUTES_OF_DAY = 1440;

/**
 * Longest that a shop may be quiet. Judgement: what waits has to come up at some time of the day,
 * and a clock that is set by an hour or two must not carry past it.
 */
export const LONGEST_QUIET = 20 * 60;

/** From one minute of the day on to another. */
export const minutesBetween = (from: number, to: number): number =>
  (to - from + MINUTES_OF_DAY) % MINUTES_OF_DAY;

/** Reads the clock on the wall of a time zone: the minute of its day. */
const wallClock = (zone: string): ((at: number) => number) => {
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  });
  return (at) => {
    const [hour = 0, minute = 0] = format.format(at).split(':').map(Number);
    return hour * 60 + minute;
  };
};

/**
 * The first moment from here on that is not quiet: this one, or the end of the quiet hours as the
 * shop's clock shows it, also in a night in which the clock is set.
 */
export const afterQuiet = (at: number, quiet: QuietHours | null, zone: string): number => {
  if (quiet === null) return at;
  const minuteAt = wallClock(zone);
  const length = minutesBetween(quiet.from, quiet.to);
  const isQuiet = (moment: number): boolean =>
    minutesBetween(quiet.from, minuteAt(moment)) < length;
  if (!isQuiet(at)) return at;
  let last = Math.floor(at / MINUTE_MS) * MINUTE_MS;
  let first = last;
  // A clock that is set back on the way shows the last hour again: then there is more to wait.
  while (isQuiet(first)) first += minutesBetween(minuteAt(first), quiet.to) * MINUTE_MS;
  // A clock that was set forward came to the end before: it lies between the two.
  while (first - last > MINUTE_MS) {
    const middle = last + Math.floor((first - last) / (2 * MINUTE_MS)) * MINUTE_MS;
    if (isQuiet(middle)) last = middle;
    else first = middle;
  }
  return first;
};
