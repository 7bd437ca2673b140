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
    console.error(describeFailure(error));
  }
  process.exit(code); // work that was given up may still be waiting for something
}

const REFUSALS = {
  ENOSPC: "The disk is full. Make room and start again.",
  EROFS: "This disk can only be read. Put the clone where this account can write.",
  EACCES: "This account may not write there. Start as the person to whom the clone belongs.",
};

/**
 * What to print of a failure: a sentence where there is one, and all of it where it is our own bug.
 * @param {any} error
 */
export function describeFailure(error) {
  if (error instanceof Told) return `\n${error.message}`;
  const refusal = REFUSALS[error?.code];
  return refusal ? `\n${error.message}\n${refusal}` : error;
}
