/** Two-sided 95 % point of the standard normal distribution. */
const Z_95 = 1.959963984540054;

/**
 * Wilson score interval of a share, 95 %.
 * @param right  successes, 0 ≤ right ≤ n
 * @returns      limits in [0, 1], or null where nothing was counted
 * @source Wilson 1927; Newcombe 1998, method 3
 */
export function wilsonInterval(right: number, n: number): { low: number; high: number } | null {
  if (n === 0) return null;
  const share = right / n;
  const z2 = Z_95 ** 2;
  const centre = (share + z2 / (2 * n)) / (1 + z2 / n);
  const half = (Z_95 / (1 + z2 / n)) * Math.sqrt((share * (1 - share)) / n + z2 / (4 * n ** 2));
  // At the ends the limit is exactly 0 or 1; floating point may miss it by a hair.
  return { low: right === 0 ? 0 : Math.max(0, centre - half), high: right === n ? 1 : Math.min(1, centre + half) };
}
