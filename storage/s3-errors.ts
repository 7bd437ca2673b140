import { AppError } from "@/lib/core/errors";

/** The code that the store gave, or the network's, or the client's. */
export function errorCode(error: unknown): string {
  if (typeof error !== "object" || error === null) return "";
  const { name, Code, code } = error as { name?: unknown; Code?: unknown; code?: unknown };
  for (const each of [code, Code, name]) if (typeof each === "string" && each !== "" && each !== "Error") return each;
  return "";
}

function httpStatus(error: unknown): number | undefined {
  return (error as { $metadata?: { httpStatusCode?: number } }).$metadata?.httpStatusCode;
}

/** Whether the store says that the object, bucket or upload isn't there. A HEAD has no body, so only its status tells. */
export const isMissing = (error: unknown): boolean =>
  ["NoSuchKey", "NotFound", "NoSuchUpload", "NoSuchBucket"].includes(errorCode(error)) || httpStatus(error) === 404;

const NETWORK = /^(ECONN|EPIPE|ENOTFOUND|EAI_AGAIN|EHOSTUNREACH|ENETUNREACH|ETIMEDOUT|TimeoutError|NetworkingError)/;

/**
 * Runs a call to the store and says in the product's terms what went wrong: AppError("unavailable") if the store can't
 * be reached or is out of order. Whatever else it refuses is passed on as it came.
 */
export async function callStore<T>(call: () => Promise<T>): Promise<T> {
  try {
    return await call();
  } catch (error) {
    const status = httpStatus(error);
    if (NETWORK.test(errorCode(error)) || (status !== undefined && status >= 500)) {
      const unavailable = new AppError("unavailable", "The file store can't be reached at the moment. Please try again in a minute.");
      unavailable.cause = error; // For the log; the sentence is for people.
      throw unavailable;
    }
    throw error;
  }
}
