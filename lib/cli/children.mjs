import { spawn } from "node:child_process";
import { closeSync, mkdirSync, openSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { setTimeout as pause } from "node:timers/promises";
import { identify, isAlive } from "./process-identity.mjs";
import { Told } from "./told.mjs";

const GRACE_MS = 12_000; // the worker is given ten seconds to finish what it does

/** The servers that a command started, in the order of their start; they are stopped in the opposite order. */
export class Children {
  #running = [];
  #stopping = false;
  #reportEnd;

  /** Resolves with a sentence when a child ends that nobody stopped. */
  unexpectedEnd = new Promise((resolve) => (this.#reportEnd = resolve));

  /** @param {string} dataFolder  logs and the list of what runs are kept there. */
  constructor(dataFolder) {
    this.logFolder = join(dataFolder, "logs");
    this.listFile = join(dataFolder, "children.json");
    mkdirSync(this.logFolder, { recursive: true });
  }

  /** Ends what a copy left behind that was killed before it could stop its servers. */
  async stopLeftovers() {
    const left = readList(this.listFile).filter(isAlive);
    for (const identity of left) await endGroup(identity);
    rmSync(this.listFile, { force: true });
    return left.length;
  }

  /**
   * Starts a server in a process group of its own, so that Ctrl-C reaches only us and we can stop things in order.
   * @param {string} name  also of its log.
   * @param {string[]} args  for Node.
   * @param {{ cwd: string, env: Record<string, string>, echo?: boolean }} options  `echo`: also show what it prints.
   */
  start(name, args, { cwd, env, echo = false }) {
    if (this.#stopping) throw new Told(`The ${name} was not started, because everything is being stopped.`);
    const log = join(this.logFolder, `${name}.log`);
    const file = openSync(log, "w");
    const child = spawn(process.execPath, args, {
      cwd, env, detached: true, stdio: echo ? ["ignore", "pipe", "pipe"] : ["ignore", file, file],
    });
    for (const stream of [child.stdout, child.stderr]) {
      stream?.on("data", (chunk) => {
        writeFileSync(file, chunk);
        process.stdout.write(String(chunk).replace(/^(?=.)/gm, `${name.padEnd(6)} | `));
      });
    }
    const entry = { name, log, pid: child.pid, identity: child.pid && identify(child.pid), hasEnded: false };
    child.on("error", (error) => this.#ended(entry, file, error.message));
    child.on("close", (code, signal) => this.#ended(entry, file, signal ? `signal ${signal}` : `code ${code}`));
    this.#running.push(entry);
    this.#keepList();
  }

  #ended(entry, file, how) {
    if (entry.hasEnded) return;
    entry.hasEnded = true;
    closeSync(file);
    if (!this.#stopping) this.#reportEnd(`The ${entry.name} ended by itself (${how}). The last lines of ${entry.log}:\n${lastLines(entry.log)}`);
  }

  /**
   * Waits for something of a server, unless a server ends first.
   * @template T
   * @param {Promise<T>} ready
   * @returns {Promise<T>}
   */
  async orEnd(ready) {
    return Promise.race([ready, this.unexpectedEnd.then((sentence) => { throw new Told(sentence); })]);
  }

  /** Stops everything, the last one started first. Asked a second time, it no longer waits. */
  async stopAll() {
    const isImpatient = this.#stopping;
    this.#stopping = true;
    for (const { identity } of this.#running.toReversed()) if (identity) await endGroup(identity, isImpatient ? 0 : GRACE_MS);
    rmSync(this.listFile, { force: true });
  }

  #keepList() {
    writeFileSync(this.listFile, JSON.stringify(this.#running.flatMap(({ identity }) => identity ?? [])));
  }
}

async function endGroup(identity, graceMs = GRACE_MS) {
  const group = -Number.parseInt(identity, 10);
  const send = (signal) => {
    try {
      process.kill(group, signal);
    } catch {
      // Gone already.
    }
  };
  if (isAlive(identity)) send("SIGTERM");
  for (const until = Date.now() + graceMs; isAlive(identity) && Date.now() < until; ) await pause(50);
  send("SIGKILL"); // also what a server that ended left in its group
}

function readList(path) {
  try {
    return JSON.parse(readFileSync(path, "utf8"));
  } catch {
    return [];
  }
}

/**
 * The end of a log, for people.
 * @param {string} path
 */
export function lastLines(path, count = 15) {
  const text = readFileSync(path, "utf8").trim();
  return text ? text.split("\n").slice(-count).join("\n") : "(it printed nothing)";
}
