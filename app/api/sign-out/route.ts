import { isOwnOrigin } from "../../../lib/server/own-origin";
import { signOut } from "../../../lib/server/sign-in";

/** Ends the session: the cookie is taken back, and would open nothing any more if someone had kept it. */
export async function POST(request: Request): Promise<Response> {
  if (!isOwnOrigin(request.headers)) return new Response(null, { status: 403 });
  const headers = new Headers({
    location: "/sign-in?problem=signedOut",
    "cache-control": "no-store",
  });
  for (const cookie of await signOut(request.headers)) headers.append("set-cookie", cookie);
  return new Response(null, { status: 303, headers });
}
