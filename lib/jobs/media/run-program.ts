import { spawn } from "node:child_process";
import { existsSync } from "node:fs";
import { MediaFault } from "@/lib/jobs/media/media-fault";

const MEMORY_BYTES = 4 * 1024 ** 3;
const KEPT_ERROR_CHARACTERS = 4000;
const KEPT_OUTPUT_CHARACTERS = 1024 * 1024;

export type Bounds = {
  seconds: number;
  /** The program may write no file larger than this. */
  fileBytes: number;
  signal: AbortSignal;
  /** Called with each line of standard output; without it the output is gathered and returned. */
  onLine?: (line: string) => void;
};

const NOT_STARTED = new Set([126, 127]);

/** What keeps a program that reads a stranger's file within bounds: memory, file size, processor time, low priority, and that it dies with us. */
function boundedCommand(program: string, args: readonly string[], { seconds, fileBytes }: Bounds): [command: string, args: string[]] {
  const wrappers = [
    ["/usr/bin/setpriv", "--pdeathsig", "KILL"],
    ["/usr/bin/nice", "-n", "10"],
    ["/usr/bin/prlimit", `--as=${MEMORY_BYTES}`, `--fsize=${Math.ceil(fileBytes)}`, "--core=0", `--cpu=${Math.ceil(seconds * 8)}`],
  ].filter(([path]) => path !== undefined && existsSync(path));
  const [command = program, ...rest] = [...wrappers.flat(), program, ...args];
  return [command, rest];
}

/**
 * Runs a program to its end, at low priority and within bounds.
 * @returns what it wrote to standard output
 * @throws MediaFault if it ends with an error or takes too long; the signal's reason if that is raised
 */
export async function runProgram(program: string, args: readonly string[], bounds: Bounds): Promise<string> {
  bounds.signal.throwIfAborted();
  const [command, commandArgs] = boundedCommand(program, args, bounds);
  // It gets nothing of our environment: the store's key is there.
  const env = { NODE_ENV: "production", PATH: "/usr/local/bin:/usr/bin:/bin", LANG: "C.UTF-8" } as const;
  const child = spawn(command, commandArgs, { stdio: ["ignore", "pipe", "pipe"], env });
  let output = "";
  let unread = "";
  let errors = "";
  child.stdout.setEncoding("utf8").on("data", (text: string) => {
    if (!bounds.onLine) output = (output + text).slice(0, KEPT_OUTPUT_CHARACTERS);
    else {
      const lines = (unread + text).split("\n");
      unread = lines.pop()?.slice(-1000) ?? "";
      for (const line of lines) bounds.onLine(line);
    }
  });
  child.stderr.setEncoding("utf8").on("data", (text: string) => (errors = (errors + text).slice(-KEPT_ERROR_CHARACTERS)));

  let isLate = false;
  const kill = () => child.kill("SIGKILL");
  const timer = setTimeout(() => {
    isLate = true;
    kill();
  }, bounds.seconds * 1000);
  bounds.signal.addEventListener("abort", kill, { once: true });
  try {
    const code = await new Promise<number | null>((resolve, reject) => child.once("error", reject).once("close", resolve));
    bounds.signal.throwIfAborted();
    if (isLate) throw new MediaFault(`It took longer than ${Math.round(bounds.seconds / 60)} minutes and was stopped.`, errors);
    if (NOT_STARTED.has(code ?? 0)) throw new Error(`${program} could not be started: ${errors}`);
    if (code !== 0) throw new MediaFault("The converter stopped at an error in the film.", errors);
    return output;
  } finally {
    clearTimeout(timer);
    bounds.signal.removeEventListener("abort", kill);
  }
}
