import { fail, ok, type Result } from "../values/result";
import { allMet } from "./exit-criteria";
import type { ExitCriterion } from "./exit-criterion";
import type { Decision, Role } from "./review-state";

export type Meaning = "authored" | "reviewed" | "approved";
export type Signature = Extract<Decision, { kind: "signature" }>;

/** Why a signature may not be given now. */
export type MayNotSign =
  | { readonly kind: "alreadySigned"; readonly by: string }
  | { readonly kind: "notAnAuthor" }
  | { readonly kind: "notAReviewer" }
  | { readonly kind: "notAnApprover" }
  /** An author may neither review nor approve the own revision. */
  | { readonly kind: "authorOfIt" }
  | { readonly kind: "waitsFor"; readonly meaning: Meaning }
  | { readonly kind: "criteriaOpen"; readonly open: readonly string[] }
  | { readonly kind: "notUnderReview" };

export interface SigningState {
  readonly underReview: boolean;
  readonly authors: readonly string[];
  readonly criteria: readonly ExitCriterion[];
  /** Signatures of this revision that are bound to what stands now. */
  readonly signatures: readonly Signature[];
}

/** Whether a person may sign with a meaning now: authored first, then reviewed, then, all criteria met, approved. */
export function maySign(
  meaning: Meaning,
  person: { readonly id: string; readonly roles: readonly Role[] },
  state: SigningState,
): Result<true, MayNotSign> {
  if (!state.underReview) return fail({ kind: "notUnderReview" });
  const held = state.signatures.find((signature) => signature.meaning === meaning);
  if (held !== undefined) return fail({ kind: "alreadySigned", by: held.name });
  const isAuthor = state.authors.includes(person.id);
  if (meaning === "authored") return isAuthor ? ok(true) : fail({ kind: "notAnAuthor" });
  if (meaning === "reviewed" && !person.roles.includes("reviewer"))
    return fail({ kind: "notAReviewer" });
  if (meaning === "approved" && !person.roles.includes("approver"))
    return fail({ kind: "notAnApprover" });
  if (isAuthor) return fail({ kind: "authorOfIt" });
  const before: Meaning = meaning === "reviewed" ? "authored" : "reviewed";
  if (!state.signatures.some((signature) => signature.meaning === before))
    return fail({ kind: "waitsFor", meaning: before });
  if (meaning === "approved" && !allMet(state.criteria)) {
    const open = state.criteria.flatMap((criterion) =>
      criterion.verdict === "pass" ? [] : criterion.open,
    );
    return fail({ kind: "criteriaOpen", open });
  }
  return ok(true);
}
