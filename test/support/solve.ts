/** Solves A x = b for a dense, well-behaved A by elimination with row exchanges. */
export const solve = (
  matrix: readonly (readonly number[])[],
  right: readonly number[],
): number[] => {
  const rows = matrix.map((row, i) => [...row, right[i]!]);
  const size = rows.length;
  for (let k = 0; k < size; k++) {
    let pivot = k;
    for (let i = k + 1; i < size; i++)
      if (Math.abs(rows[i]![k]!) > Math.abs(rows[pivot]![k]!)) pivot = i;
    [rows[k], rows[pivot]] = [rows[pivot]!, rows[k]!];
    for (let i = k + 1; i < size; i++) {
      const factor = rows[i]![k]! / rows[k]![k]!;
      for (let j = k; j <= size; j++) rows[i]![j]! -= factor * rows[k]![j]!;
    }
  }
  const x = new Array<number>(size).fill(0);
  for (let i = size - 1; i >= 0; i--) {
    const known = rows[i]!.slice(i + 1, size).reduce((sum, a, j) => sum + a * x[i + 1 + j]!, 0);
    x[i] = (rows[i]![size]! - known) / rows[i]![i]!;
  }
  return x;
};
