import type { MayNotSign } from "../../lib/review/signing";
import { signingRefusal } from "./signing";

/** Said to one whose session has ended. */
export const signedOut =
  "You are signed out. Sign in again in another tab; what you wrote here stays.";

/** Why a decision was not taken, and what to do. */
const DECISIONS = {
  notFound: "There is no such revision in your workspace.",
  notUnderReview: "This revision is not under review any longer; open the one that is.",
  noRight: "Your role in this workspace does not allow this. Ask a reviewer or an approver.",
  authorOfIt: "You are an author of this revision: somebody else has to do this.",
  noReason: "Give a reason in a few words.",
  noSuchItem: "This item is not among the changes of this revision. Reload the page.",
  noSuchFinding: "This finding is not there. Reload the page.",
  alreadySo: "Somebody has done this already.",
  nothingToWaive: "There is nothing to waive: the number is inside its limit, or not known yet.",
  changedMeanwhile:
    "The number has changed since this page was shown. Reload the page, look at it, then waive.",
} as const;

export function decisionRefusal(failure: { readonly kind: keyof typeof DECISIONS }): string {
  return DECISIONS[failure.kind];
}

const PROOFS = {
  wrongPassword: "That is not your password. Nothing was signed.",
  tooManyAttempts: "Too many wrong passwords. Wait a quarter of an hour, then try again.",
} as const;

export function proofRefusal(failure: keyof typeof PROOFS): string {
  return PROOFS[failure];
}

type SigningFailure =
  | MayNotSign
  | { readonly kind: "notFound" }
  | { readonly kind: "notSolved" }
  | { readonly kind: "proofOfAnother" }
  | { readonly kind: "changedMeanwhile"; readonly what: readonly string[] };

/** Why nothing was signed, and what to do. */
export function signingSentence(failure: SigningFailure): string {
  switch (failure.kind) {
    case "notFound":
      return DECISIONS.notFound;
    case "notSolved":
      return "The worker has not finished this revision yet. Wait for its results, then sign.";
    case "proofOfAnother":
      return "The password proved another person. Sign out and in again.";
    case "changedMeanwhile":
      return `Since this page was shown, these have changed: ${failure.what.join(", ")}. Look at them, then sign.`;
    default:
      return signingRefusal(failure);
  }
}
