import { Children } from "./children.mjs";
import { stopCluster } from "./cluster.mjs";
import { lockDataFolder } from "./lock.mjs";
import { stopPrograms } from "./programs.mjs";

/**
 * Does a command's work on a data folder that is ours alone, and stops all that it started in the end: when the work is done, when it
 * fails, and when somebody asks by Ctrl-C or a signal.
 * @param {string} dataFolder
 * @param {(children: Children) => Promise<number>} work  gives the exit code.
 * @param {{ askedCode?: number }} [options]  exit code when the end was asked for.
 * @returns {Promise<number>}
 */
export async function supervise(dataFolder, work, { askedCode = 130 } = {}) {
  const release = lockDataFolder(dataFolder);
  const children = new Children(dataFolder);
  let askings = 0;
  const asked = new Promise((resolve) => {
    const ask = () => {
      if (askings++ > 0) return void children.stopAll();
      process.stdout.write("\n  Stopping what was started …\n");
      resolve(askedCode);
    };
    for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, ask);
  });
  try {
    await children.stopLeftovers();
    return await Promise.race([work(children), asked]);
  } finally {
    await stopPrograms();
    await children.stopAll();
    await stopCluster(dataFolder);
    release();
  }
}
