/** One finished step, its name in a column of its own. */
export function line(step: string, outcome: string): void {
  console.log(`  ${step.padEnd(9)} ${outcome}`);
}

/** Rows under their titles, each column as wide as its longest cell. */
export function table(titles: readonly string[], rows: readonly (readonly string[])[]): string {
  const all = [titles, ...rows];
  const widths = titles.map((_, column) => Math.max(...all.map((row) => (row[column] ?? '').length)));
  return all
    .map((row) => `  ${row.map((cell, column) => cell.padEnd(widths[column] ?? 0)).join('   ')}`.trimEnd())
    .join('\n');
}
