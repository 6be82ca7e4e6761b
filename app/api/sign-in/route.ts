import { isOwnOrigin } from "../../../lib/server/own-origin";
import { ownPath } from "../../../lib/server/own-path";
import { signIn } from "../../../lib/server/sign-in";

/** Takes the sign-in form; it works before any script has loaded. */
export async function POST(request: Request): Promise<Response> {
  if (!isOwnOrigin(request.headers)) return new Response(null, { status: 403 });
  const form = await request.formData().catch(() => new FormData());
  const next = ownPath(textOf(form, "next"));
  const outcome = await signIn({
    email: textOf(form, "email"),
    password: textOf(form, "password"),
    headers: request.headers,
  });
  if (outcome.ok) return seeOther(next, outcome.value);
  const query = new URLSearchParams({ problem: outcome.error });
  if (next !== "/") query.set("next", next);
  return seeOther(`/sign-in?${query}`, []);
}

function textOf(form: FormData, name: string): string {
  const value = form.get(name);
  return typeof value === "string" ? value : "";
}

function seeOther(location: string, cookies: readonly string[]): Response {
  const headers = new Headers({ location, "cache-control": "no-store" });
  for (const cookie of cookies) headers.append("set-cookie", cookie);
  return new Response(null, { status: 303, headers });
}
