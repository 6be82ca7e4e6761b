/**
 * Whether a form was sent by a page of ours. Browsers say where a form comes from; who does not say is refused.
 * Only the host is compared: a proxy before the server may speak HTTPS.
 */
export function isOwnOrigin(headers: Headers): boolean {
  const origin = headers.get("origin");
  return origin !== null && URL.canParse(origin) && new URL(origin).host === headers.get("host");
}
