import { setTimeout as pause } from "node:timers/promises";
import { connect } from "node:net";
import { Told } from "./told.mjs";

async function waitFor(what, isReady, timeoutMs) {
  for (const until = Date.now() + timeoutMs; Date.now() < until; await pause(60)) {
    if (await isReady()) return;
  }
  throw new Told(`The ${what} gave no answer within ${timeoutMs / 1000} seconds.`);
}

/**
 * Waits until a server answers at all; even a refusal is an answer, an error of the server is not.
 * @param {string} what  its name, for people.
 * @param {string} url
 */
export const waitForHttp = (what, url, timeoutMs = 60_000) =>
  waitFor(what, () => fetch(url, { redirect: "manual" }).then((answer) => answer.status < 500, () => false), timeoutMs);

/**
 * Waits until something listens at a port of the loopback.
 * @param {string} what
 * @param {number} port
 */
export const waitForTcp = (what, port, timeoutMs = 30_000) =>
  waitFor(what, () => new Promise((resolve) => {
    const socket = connect(port, "127.0.0.1");
    socket.once("connect", () => (socket.destroy(), resolve(true)));
    socket.once("error", () => resolve(false));
  }), timeoutMs);
