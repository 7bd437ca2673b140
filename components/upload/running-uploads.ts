import { uploadDoors } from "@/components/upload/upload-doors";
import { sendFile, type SendingState } from "@/components/upload/uploader";

/** A file on its way in this tab. It outlives the page it was picked on, as long as the tab stays. */
export type RunningUpload = {
  key: string;
  org: string;
  file: File;
  /** null while it waits for its turn. */
  state: SendingState | null;
  outcome: { recordingId: string } | null;
  problem: string | null;
};

let uploads: readonly RunningUpload[] = [];
const stops = new Map<string, AbortController>();
const listeners = new Set<() => void>();
let turn: Promise<void> = Promise.resolve();
let made = 0;

export const subscribe = (listener: () => void): (() => void) => {
  listeners.add(listener);
  return () => listeners.delete(listener);
};
export const currentUploads = (): readonly RunningUpload[] => uploads;
const NONE: readonly RunningUpload[] = [];
export const noUploads = (): readonly RunningUpload[] => NONE;

function change(next: readonly RunningUpload[]): void {
  uploads = next;
  const isBusy = uploads.some((upload) => !upload.outcome && !upload.problem);
  // Leaving is no loss, since it can go on later, but it should be meant.
  window.removeEventListener("beforeunload", askBeforeLeaving);
  if (isBusy) window.addEventListener("beforeunload", askBeforeLeaving);
  for (const listener of listeners) listener();
}
const askBeforeLeaving = (event: BeforeUnloadEvent) => event.preventDefault();

const update = (key: string, part: Partial<RunningUpload>) =>
  change(uploads.map((upload) => (upload.key === key ? { ...upload, ...part } : upload)));

/** Sends recordings one after the other, each in several parts at a time. */
export function addUploads(org: string, files: readonly File[]): void {
  for (const file of files) {
    const key = `upload-${(made += 1)}`;
    change([...uploads, { key, org, file, state: null, outcome: null, problem: null }]);
    stops.set(key, new AbortController());
    turn = turn.then(() => run(key, org, file));
  }
}

async function run(key: string, org: string, file: File): Promise<void> {
  const stop = stops.get(key);
  if (!stop || stop.signal.aborted) return;
  const awake = await stayAwake();
  let uploadId: string | null = null;
  try {
    const tell = throttle((state: SendingState) => update(key, { state }));
    const onState = (state: SendingState) => {
      uploadId = state.uploadId;
      tell(state);
    };
    const { recordingId } = await sendFile(file, { org, purpose: "recording", signal: stop.signal, onState });
    if (recordingId) update(key, { outcome: { recordingId } });
  } catch (error) {
    // What can't be thrown away now is shown as unfinished and can be given up there.
    if (stop.signal.aborted && uploadId) await uploadDoors(org).cancel(uploadId).catch(() => {});
    else update(key, { problem: error instanceof Error ? error.message : "The file could not be sent." });
  } finally {
    awake?.();
    stops.delete(key);
  }
}

/** Gives an upload up: nothing of it stays, here or in the store. */
export function cancelUpload(key: string): void {
  stops.get(key)?.abort(new Error("Given up."));
  dismissUpload(key);
}

export function dismissUpload(key: string): void {
  change(uploads.filter((upload) => upload.key !== key));
}

/** Tries a file again that could not be sent; what has arrived of it is kept. */
export function retryUpload(key: string): void {
  const upload = uploads.find((each) => each.key === key);
  if (!upload) return;
  dismissUpload(key);
  addUploads(upload.org, [upload.file]);
}

/** Progress comes many times a second; a page is told some four times, and of each new phase at once. */
function throttle(tell: (state: SendingState) => void): (state: SendingState) => void {
  let last: { phase: string; atMs: number } | null = null;
  return (state) => {
    const nowMs = Date.now();
    if (last && last.phase === state.phase && nowMs - last.atMs < 250) return;
    last = { phase: state.phase, atMs: nowMs };
    tell(state);
  };
}

/** Keeps a phone's screen on while it sends, where the browser lets us; a dark phone stops sending. */
async function stayAwake(): Promise<(() => void) | undefined> {
  try {
    const lock = await navigator.wakeLock.request("screen");
    return () => void lock.release();
  } catch {
    return undefined;
  }
}
