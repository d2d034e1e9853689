/** Something the person at the keyboard can put right: shown as written, without a stack. */
export class Refusal extends Error {
  /** @param {string} sentence what is wrong and what to do about it */
  constructor(sentence) {
    super(sentence);
    this.name = 'Refusal';
  }
}

/**
 * Runs a command's body and turns a refusal into a plain sentence and exit code 1.
 * @param {() => Promise<number>} body resolves to the exit code
 * @returns {Promise<void>}
 */
export async function runCommand(body) {
  try {
    process.exitCode = await body();
  } catch (error) {
    process.exitCode = 1;
    if (error instanceof Refusal) console.error(`\n${error.message}\n`);
    else console.error(error);
  }
}
