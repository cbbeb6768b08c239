/** How near the answer is brought, relative to itself. */
const NEAR = 1e-12;

/** Where an increasing function that starts at 0 reaches a value, between 0 and the greatest. */
export const bisect = (rising: (at: number) => number, value: number, greatest: number): number => {
  if (value <= 0) return 0;
  let low = 0;
  let high = greatest;
  while (high - low > NEAR * high) {
    const middle = (low + high) / 2;
    if (rising(middle) < value) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
};
