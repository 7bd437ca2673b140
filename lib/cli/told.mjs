/** A failure that people can mend: one sentence for the screen, no stack. Anything else that is thrown is a bug of ours. */
export class Told extends Error {}

/**
 * Runs a command's main function and ends the process with the right code.
 * @param {() => Promise<number | void>} main  gives the exit code; nothing means 0.
 */
export async function runCommand(main) {
  let code = 1;
  try {
    code = (await main()) ?? 0;
  } catch (error) {
    console.error(error instanceof Told ? `\n${error.message}` : error);
  }
  process.exit(code); // work that was given up may still be waiting for something
}
