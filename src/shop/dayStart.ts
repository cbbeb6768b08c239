const HOUR_MS = 3_600_000;
const MINUTE_MS = 60_000;
/** No two days begin further apart than this, also where the clock is set. */
const LONGEST_DAY_MS = 26 * HOUR_MS;

/** The day that the clock on the wall of a time zone shows: 20250106. */
const dayIn = (zone: string): ((at: number) => number) => {
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  });
  return (at) => Number(format.format(at).split('/').reverse().join(''));
};

/** The first moment of the day that it is, where the shop is: also in a night without a midnight. */
export const startOfDay = (at: number, zone: string): number => {
  const dayOf = dayIn(zone);
  const today = dayOf(at);
  // Days begin on a whole minute everywhere.
  let last = Math.floor((at - LONGEST_DAY_MS) / MINUTE_MS) * MINUTE_MS;
  let first = Math.ceil(at / MINUTE_MS) * MINUTE_MS;
  while (first - last > MINUTE_MS) {
    const middle = last + Math.floor((first - last) / (2 * MINUTE_MS)) * MINUTE_MS;
    if (dayOf(middle) < today) last = middle;
    else first = middle;
  }
  return first;
};

/** The first moment of the day before. */
export const startOfYesterday = (at: number, zone: string): number =>
  startOfDay(startOfDay(at, zone) - 1, zone);
