import type { NoProof } from "../../lib/server/sign-in";

/** What the sign-in page may have to say first. */
export type SignInNotice = NoProof | "expired" | "signedOut";

const SENTENCES: Readonly<Record<SignInNotice, string>> = {
  wrongPassword: "This address and password do not belong together. Check both and try again.",
  tooManyAttempts: "Too many wrong passwords for this address. Try again in a quarter of an hour.",
  expired: "Your session has ended. Sign in again to go on where you were.",
  signedOut: "You are signed out.",
};

/** The sentence for a notice named in the page's address; null for none, and for a name that is not one. */
export function signInSentence(notice: string | undefined): string | null {
  return notice !== undefined && isNotice(notice) ? SENTENCES[notice] : null;
}

/** Whether it reports a failure rather than a fact. */
export function isFailure(notice: string | undefined): boolean {
  return notice === "wrongPassword" || notice === "tooManyAttempts";
}

function isNotice(name: string): name is SignInNotice {
  return Object.hasOwn(SENTENCES, name);
}
