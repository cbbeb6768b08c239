/** Area under a curve by Simpson's rule, exact for cubics between kinks. */
export const simpson = (
  curve: (at: number) => number,
  from: number,
  to: number,
  strips = 2000,
): number => {
  const step = (to - from) / strips;
  let sum = curve(from) + curve(to);
  for (let i = 1; i < strips; i++) sum += curve(from + i * step) * (i % 2 === 1 ? 4 : 2);
  return (sum * step) / 3;
};
