import { NextResponse, type NextRequest } from "next/server";

/**
 * Sends every page with a policy that lets in our own scripts by a nonce of this request and nothing from anywhere else, except the
 * object store, whose origin is known when the server runs and not when it is built. Authorisation has no place here.
 */
export function proxy(request: NextRequest): NextResponse {
  const nonce = btoa(crypto.randomUUID());
  const policy = contentPolicy(nonce, new URL(process.env.S3_PUBLIC_ENDPOINT ?? request.url).origin, process.env.NODE_ENV === "development");
  const headers = new Headers(request.headers);
  headers.set("x-nonce", nonce);
  headers.set("content-security-policy", policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set("content-security-policy", policy);
  return response;
}

function contentPolicy(nonce: string, store: string, development: boolean): string {
  return [
    "default-src 'none'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ""}`,
    `style-src 'self' ${development ? "'unsafe-inline'" : `'nonce-${nonce}'`}`,
    "style-src-attr 'unsafe-inline'", // the framework and the player set sizes and places by style attributes
    `img-src 'self' data: blob: ${store}`,
    `media-src 'self' blob: ${store}`,
    `connect-src 'self' ${store}${development ? " ws:" : ""}`,
    "font-src 'self'",
    "manifest-src 'self'",
    "worker-src 'self'",
    "form-action 'self'",
    "base-uri 'none'",
    "frame-ancestors 'none'",
  ].join("; ");
}

export const config = { matcher: ["/((?!_next/static|_next/image|icon.svg).*)"] };
