/** The store's answer to a part that it did not take. */
export class PartRefused extends Error {
  readonly status: number;

  constructor(status: number) {
    super(`The store answered ${status}.`);
    this.name = "PartRefused";
    this.status = status;
  }
}

/** Sends bytes to an address in the store. @throws PartRefused; any other error means that the connection broke off */
export type PutPart = (url: string, body: Blob, onSent: (bytes: number) => void, signal: AbortSignal) => Promise<void>;

/** Without a byte for so long, a connection is taken for dead: on a phone's wi-fi it may not say so itself. */
const STALLED_AFTER_MS = 45_000;

/** By XMLHttpRequest, since fetch does not tell how many bytes have gone. */
export const putPart: PutPart = (url, body, onSent, signal) =>
  new Promise((resolve, reject) => {
    signal.throwIfAborted();
    const request = new XMLHttpRequest();
    let timer = setTimeout(() => request.abort(), STALLED_AFTER_MS);
    const stop = () => request.abort();
    const finish = (settle: () => void) => () => {
      clearTimeout(timer);
      signal.removeEventListener("abort", stop);
      settle();
    };
    request.upload.onprogress = (event) => {
      clearTimeout(timer);
      timer = setTimeout(() => request.abort(), STALLED_AFTER_MS);
      onSent(event.loaded);
    };
    request.onload = finish(() => (request.status >= 200 && request.status < 300 ? resolve() : reject(new PartRefused(request.status))));
    request.onerror = finish(() => reject(new Error("The connection broke off.")));
    request.onabort = finish(() => reject(signal.aborted ? signal.reason : new Error("The connection stood still.")));
    signal.addEventListener("abort", stop);
    request.open("PUT", url);
    request.send(body);
  });
