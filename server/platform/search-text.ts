/** A pattern for `ilike` that finds the words as they are typed: its own wild cards mean themselves. */
export function containing(text: string): string {
  return `%${text.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
}
