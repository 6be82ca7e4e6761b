import { randomBytes } from "node:crypto";
import type { IncomingMessage, ServerResponse } from "node:http";

const YEAR_S = 31_536_000;

/**
 * Says what a page of ours may do: nothing from elsewhere, in no one else's frame. Scripts inside a page carry a number
 * used once, which Next takes from the request's own copy of the policy.
 */
export function secureHeaders(
  request: IncomingMessage,
  response: ServerResponse,
  how: { readonly development: boolean; readonly overHttps: boolean },
): void {
  const policy = contentPolicy(randomBytes(16).toString("base64"), how.development);
  request.headers["content-security-policy"] = policy;
  response.setHeader("Content-Security-Policy", policy);
  response.setHeader("X-Content-Type-Options", "nosniff");
  response.setHeader("Referrer-Policy", "same-origin");
  response.setHeader("Cross-Origin-Opener-Policy", "same-origin");
  response.setHeader("Cross-Origin-Resource-Policy", "same-origin");
  response.setHeader("Permissions-Policy", "camera=(), geolocation=(), microphone=()");
  if (how.overHttps) response.setHeader("Strict-Transport-Security", `max-age=${YEAR_S}`);
}

function contentPolicy(nonce: string, development: boolean): string {
  // The development pages evaluate their modules; the engine's kernels are WebAssembly.
  const evaluation = development ? "'unsafe-eval'" : "'wasm-unsafe-eval'";
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' ${evaluation}`,
    // Style attributes place every symbol of a drawing.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "worker-src 'self' blob:",
    "connect-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");
}
