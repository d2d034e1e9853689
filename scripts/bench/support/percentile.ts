/** The smallest of the values that at least this share of them (in per cent) does not exceed: the nearest-rank method. */
export function percentile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  const value = sorted[Math.max(0, Math.ceil((share / 100) * sorted.length) - 1)];
  if (value === undefined) throw new Error('nothing was measured');
  return value;
}
