import { ApiProblem } from "@/components/api/client";
import { inTurn } from "@/components/upload/in-turn";
import { pause, persist, mayPass } from "@/components/upload/patience";
import { PartRefused, putPart, type PutPart } from "@/components/upload/put-part";
import { RateMeter } from "@/components/upload/rate-meter";
import { uploadDoors, type UploadDoors } from "@/components/upload/upload-doors";
import { partCount, partRange } from "@/lib/core/uploads/part-plan";
import type { CompletedUpload, UploadView } from "@/lib/schemas/uploads";

/**
 * How far a file is. "waiting": the connection is down and it goes on by itself; "elsewhere": another tab is at it;
 * "checking": all bytes have gone and the server puts them together.
 */
export type SendingState = {
  phase: "starting" | "sending" | "waiting" | "elsewhere" | "checking";
  uploadId: string | null;
  sentBytes: number;
  totalBytes: number;
  leftMs: number | null;
};

export type SendOptions = {
  org: string;
  purpose: "recording" | "evidence";
  signal: AbortSignal;
  onState?: (state: SendingState) => void;
  /** For tests and other runtimes. */
  doors?: UploadDoors;
  put?: PutPart;
};

const PARTS_AT_A_TIME = 4;
const ADDRESSES_AT_A_TIME = 32;
const MOST_REFUSALS = 5;
const MOST_COMPLETIONS = 3;

/**
 * Sends a file in parts straight to the store, several at a time, for as long as it takes: lost connections are waited out, and the same file
 * given again after a reload goes on where it stopped. What has arrived is what the store says has arrived.
 * @throws ApiProblem with a sentence when the server refuses; Error with one when the file can't be read; the signal's reason when stopped
 */
export async function sendFile(file: File, options: SendOptions): Promise<CompletedUpload> {
  const doors = options.doors ?? uploadDoors(options.org);
  const sending = new Sending(file, doors, options);
  const upload = await sending.start();
  return inTurn(`witnessline-upload-${upload.uploadId}`, options.signal, () => sending.tell("elsewhere"), () => sending.send());
}

class Sending {
  readonly #file: File;
  readonly #doors: UploadDoors;
  readonly #options: SendOptions;
  readonly #put: PutPart;
  readonly #addresses = new Map<number, string>();
  readonly #inFlight = new Map<number, number>();
  #fetching: Promise<void> | null = null;
  #missing: number[] = [];
  #arrivedBytes = 0;
  #upload: UploadView | null = null;
  #meter: RateMeter | null = null;
  #phase: SendingState["phase"] = "starting";
  #inTrouble = 0;

  constructor(file: File, doors: UploadDoors, options: SendOptions) {
    this.#file = file;
    this.#doors = doors;
    this.#options = options;
    this.#put = options.put ?? putPart;
  }

  get #signal(): AbortSignal {
    return this.#options.signal;
  }

  /** Tells the page how far it is. */
  tell(phase: SendingState["phase"] = this.#phase): void {
    this.#phase = phase;
    const sentBytes = this.#arrivedBytes + [...this.#inFlight.values()].reduce((sum, bytes) => sum + bytes, 0);
    this.#meter?.note(sentBytes, Date.now());
    const isStuck = this.#inTrouble > 0 && this.#inTrouble >= Math.max(1, this.#inFlight.size);
    this.#options.onState?.({
      phase: isStuck ? "waiting" : phase,
      uploadId: this.#upload?.uploadId ?? null,
      sentBytes,
      totalBytes: this.#file.size,
      leftMs: phase === "sending" && !isStuck ? (this.#meter?.leftMs ?? null) : null,
    });
  }

  readonly #trouble = (isInTrouble: boolean): void => {
    this.#inTrouble += isInTrouble ? 1 : -1;
    this.#inTrouble = Math.max(0, this.#inTrouble);
    this.tell();
  };

  #ask<T>(question: () => Promise<T>): Promise<T> {
    let told = false;
    return persist(question, this.#signal, (isInTrouble) => {
      if (told !== isInTrouble) this.#trouble(isInTrouble);
      told = isInTrouble;
    });
  }

  async start(): Promise<UploadView> {
    this.tell("starting");
    const { name: fileName, type: mediaType, size: sizeBytes, lastModified } = this.#file;
    const input = { purpose: this.#options.purpose, fileName, mediaType, sizeBytes, modifiedMs: Math.floor(lastModified) };
    this.#upload = await this.#ask(() => this.#doors.start(input));
    // Told before anything else: whoever gave up meanwhile must learn what there is to throw away.
    this.tell();
    this.#signal.throwIfAborted();
    return this.#upload;
  }

  async send(): Promise<CompletedUpload> {
    for (let attempt = 1; ; attempt += 1) {
      const upload = await this.#ask(() => this.#doors.status(this.#started().uploadId));
      this.#signal.throwIfAborted();
      if (upload.state === "open") await this.#sendMissing(upload);
      this.tell("checking");
      try {
        return await this.#ask(() => this.#doors.complete(upload.uploadId));
      } catch (error) {
        // Parts are missing after all: the store knows which, so ask it again.
        const isIncomplete = error instanceof ApiProblem && error.code === "conflict" && attempt < MOST_COMPLETIONS;
        if (!isIncomplete) throw error;
      }
    }
  }

  async #sendMissing(upload: UploadView): Promise<void> {
    const received = new Set(upload.receivedParts);
    const all = Array.from({ length: partCount(upload.sizeBytes, upload.partSizeBytes) }, (_, index) => index + 1);
    this.#missing = all.filter((number) => !received.has(number));
    this.#arrivedBytes = upload.receivedBytes;
    this.#meter = new RateMeter(upload.sizeBytes, upload.receivedBytes, Date.now());
    this.tell("sending");
    // One part that can't be sent ends the whole; the others must not go on behind its back.
    const stop = new AbortController();
    const signal = AbortSignal.any([this.#signal, stop.signal]);
    const worker = async () => {
      for (let number = this.#missing.shift(); number !== undefined; number = this.#missing.shift()) await this.#sendPart(upload, number, signal);
    };
    try {
      await Promise.all(Array.from({ length: PARTS_AT_A_TIME }, worker));
    } catch (error) {
      stop.abort(error);
      this.#inFlight.clear();
      if (!(error instanceof PartRefused && error.status === 404)) throw error;
      // The store has no such upload any more: completed by another tab, or given up. Completing tells which.
    }
  }

  async #sendPart(upload: UploadView, number: number, signal: AbortSignal): Promise<void> {
    const { start, end } = partRange(number, upload.sizeBytes, upload.partSizeBytes);
    const body = this.#file.slice(start, end);
    let refusals = 0;
    let isInTrouble = false;
    for (let attempt = 0; ; attempt += 1) {
      this.#inFlight.set(number, 0);
      try {
        await this.#put(await this.#addressOf(upload, number), body, (bytes) => this.#note(number, Math.min(bytes, end - start)), signal);
        break;
      } catch (error) {
        signal.throwIfAborted();
        this.#addresses.delete(number); // It may have run out; the next try asks for another.
        if (error instanceof PartRefused && (error.status === 404 || (refusals += 1) > MOST_REFUSALS)) throw error;
        if (!mayPass(error)) throw error;
        await this.#assertReadable(body);
        this.#inFlight.set(number, 0);
        if (!isInTrouble) this.#trouble((isInTrouble = true));
        await pause(attempt, signal);
      }
    }
    if (isInTrouble) this.#trouble(false);
    this.#inFlight.delete(number);
    this.#arrivedBytes += end - start;
    this.tell();
  }

  #note(number: number, bytes: number): void {
    this.#inFlight.set(number, bytes);
    this.tell();
  }

  /** Addresses are asked for many at a time, those of the parts that come next along with the first. */
  async #addressOf(upload: UploadView, number: number): Promise<string> {
    if (!this.#addresses.has(number)) {
      if (this.#fetching) await this.#fetching;
      if (!this.#addresses.has(number)) {
        const next = this.#missing.filter((each) => !this.#addresses.has(each)).slice(0, ADDRESSES_AT_A_TIME - 1);
        this.#fetching = this.#doors
          .addresses(upload.uploadId, [number, ...next])
          .then((parts) => parts.forEach((part) => this.#addresses.set(part.partNumber, part.url)))
          .finally(() => (this.#fetching = null));
        await this.#fetching;
      }
    }
    const address = this.#addresses.get(number);
    if (address === undefined) throw new Error("The server gave no address for a part of the file.");
    return address;
  }

  async #assertReadable(body: Blob): Promise<void> {
    await body
      .slice(0, 1)
      .arrayBuffer()
      .catch(() => {
        throw new ApiProblem(410, "gone", "The file was changed or moved while it was sent. Pick it again.", []);
      });
  }

  #started(): UploadView {
    if (!this.#upload) throw new Error("The upload was not started.");
    return this.#upload;
  }
}
