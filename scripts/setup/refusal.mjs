/** Something the person at the keyboard can put right: shown as written, without a stack. */
export class Refusal extends Error {
  /** @param {string} sentence what is wrong and what to do about it */
  constructor(sentence) {
    super(sentence);
    this.name = 'Refusal';
  }
}

/**
 * Runs a command to its end: exits with the code its body resolves to, or with 1 and a plain sentence.
 * @param {() => Promise<number>} body
 * @returns {Promise<never>}
 */
export async function runMain(body) {
  try {
    process.exit(await body());
  } catch (error) {
    if (error instanceof Refusal) console.error(`\n${error.message}\n`);
    else console.error(error);
    process.exit(1);
  }
}
