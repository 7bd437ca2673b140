/** @param {number} began  from performance.now() */
export const secondsSince = (began) => `${((performance.now() - began) / 1000).toFixed(1)} s`;

/**
 * Does one piece of work and prints its name, what came of it and the time it took, on one line.
 * @param {string} name
 * @param {() => Promise<string> | string} work  gives what came of it, in a few words.
 * @param {{ write: (text: string) => unknown }} [out]
 */
export async function stage(name, work, out = process.stdout) {
  const began = performance.now();
  out.write(`  ${name.padEnd(20)} `);
  try {
    const outcome = await work();
    out.write(`${outcome} (${secondsSince(began)})\n`);
  } catch (error) {
    out.write(`failed (${secondsSince(began)})\n`);
    throw error;
  }
}
