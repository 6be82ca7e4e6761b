/** Who acts, and the proof of it: the only file that makes an {@link ActingMember} or a {@link Proof}. */
import { database } from "../database/client";
import type { Role } from "../review/review-state";
import { fail, ok, type Result } from "../values/result";
import { Attempts } from "./attempts";
import { authentication } from "./auth";

const proven: unique symbol = Symbol("proven");
const provenNow: unique symbol = Symbol("proven now");

/** A signed-in person in a workspace. Every read and write that touches a workspace demands one. */
export interface ActingMember {
  readonly user: string;
  readonly name: string;
  readonly workspace: string;
  readonly roles: readonly Role[];
  readonly [proven]: true;
}

/** The member gave the password again just now: demanded by a signature. */
export interface Proof {
  readonly user: string;
  readonly method: "password";
  /** ISO 8601, UTC */
  readonly at: string;
  readonly [provenNow]: true;
}

export type NotActing = "signedOut" | "notAMember";
export type NoProof = "wrongPassword" | "tooManyAttempts";

const ROLES: readonly Role[] = ["designer", "reviewer", "approver", "observer"];

/** A stranger who guesses shuts out himself first, and the account's owner only after ten such places. */
const fromOnePlace = new Attempts(10);
const fromAnywhere = new Attempts(100);
const atSigning = new Attempts(10);

/** The member behind a request, by its session cookie. */
export async function actingMember(headers: Headers): Promise<Result<ActingMember, NotActing>> {
  const session = await authentication().api.getSession({ headers });
  if (session === null) return fail("signedOut");
  const member = await database().member.findFirst({
    where: { userId: session.user.id },
    orderBy: { workspaceId: "asc" },
  });
  if (member === null) return fail("notAMember");
  return ok({
    user: session.user.id,
    name: session.user.name,
    workspace: member.workspaceId,
    roles: ROLES.filter((role) => member.roles.includes(role)),
    [proven]: true,
  });
}

/** Whether a request brings a session cookie, valid or not: without a member behind it, the session has ended. */
export function carriesSession(headers: Headers): boolean {
  return /(?:^|;\s*)(?:__Secure-)?ampersign\.session_token=[^;]/.test(headers.get("cookie") ?? "");
}

/**
 * Opens a session. An unknown address and a wrong password are the same answer after the same work.
 * @returns the cookies to set
 */
export async function signIn(given: {
  readonly email: string;
  readonly password: string;
  readonly headers: Headers;
}): Promise<Result<readonly string[], NoProof>> {
  const email = given.email.trim().toLowerCase();
  const place = `${email} from ${given.headers.get("x-ampersign-address") ?? "unknown"}`;
  if (!fromOnePlace.mayTry(place) || !fromAnywhere.mayTry(email)) return fail("tooManyAttempts");
  const response = await authentication().api.signInEmail({
    body: { email, password: given.password },
    headers: given.headers,
    asResponse: true,
  });
  if (!response.ok) {
    fromOnePlace.failed(place);
    fromAnywhere.failed(email);
    return fail("wrongPassword");
  }
  fromOnePlace.succeeded(place);
  return ok(response.headers.getSetCookie());
}

/** Ends the session of a request. @returns the cookies to set */
export async function signOut(headers: Headers): Promise<readonly string[]> {
  const response = await authentication().api.signOut({ headers, asResponse: true });
  return response.headers.getSetCookie();
}

/** Asks for the password again, where a name is put under something. */
export async function provePassword(
  member: ActingMember,
  password: string,
): Promise<Result<Proof, NoProof>> {
  if (!atSigning.mayTry(member.user)) return fail("tooManyAttempts");
  const context = await authentication().$context;
  const accounts = await context.internalAdapter.findAccounts(member.user);
  const hash = accounts.find((account) => account.providerId === "credential")?.password;
  const right = typeof hash === "string" && (await context.password.verify({ hash, password }));
  if (!right) {
    atSigning.failed(member.user);
    return fail("wrongPassword");
  }
  atSigning.succeeded(member.user);
  return ok({
    user: member.user,
    method: "password",
    at: new Date().toISOString(),
    [provenNow]: true,
  });
}
