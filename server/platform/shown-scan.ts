/** Characters of a scan that are looked at for showing: a scanner may send ten thousand. */
const lookedAt = 400;

const shownLength = 40;

/** What was read, fit to be shown and kept: short, and without the characters that cannot be seen. */
export function shownScan(raw: string): string {
  const visible = raw
    .slice(0, lookedAt)
    .replace(/[\p{Cc}\p{Cs}]/gu, ' ')
    .trim();
  const signs = Array.from(visible);
  return signs.length > shownLength ? `${signs.slice(0, shownLength).join('')}…` : visible;
}
