import { AppError } from "@/lib/core/errors";

/**
 * Refuses a write that another site's page caused. The cookie comes along by itself; the Origin header cannot be forged by a page.
 * @throws AppError("forbidden")
 */
export function assertSameOrigin(request: Request, appUrl: string): void {
  if (request.method === "GET" || request.method === "HEAD") return;
  const origin = request.headers.get("origin");
  const sameOrigin = origin ? origin === new URL(appUrl).origin : request.headers.get("sec-fetch-site") === "same-origin";
  if (!sameOrigin) throw new AppError("forbidden", "This request did not come from Witnessline's own pages, so it was refused.");
}
