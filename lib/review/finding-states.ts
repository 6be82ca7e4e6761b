import type { Decision, Finding, Role } from "./review-state";

export type Closure = Extract<Decision, { kind: "closure" }>;

/** The closure that stands on each closed finding, by the finding's id. */
export function standingClosures(decisions: readonly Decision[]): ReadonlyMap<string, Closure> {
  const closures = new Map<string, Closure>();
  for (const decision of decisions) {
    if (decision.kind === "closure") closures.set(decision.finding, decision);
    if (decision.kind === "reopening") closures.delete(decision.finding);
  }
  return closures;
}

/**
 * Whether someone may close or reopen a finding. A major one: the person who raised it, or an approver.
 * Any other: also a reviewer or designer who answers it.
 */
export function mayDecideFinding(
  finding: Pick<Finding, "severity" | "author">,
  person: { readonly id: string; readonly roles: readonly Role[] },
): boolean {
  if (finding.author === person.id || person.roles.includes("approver")) return true;
  if (finding.severity === "major") return false;
  return person.roles.includes("reviewer") || person.roles.includes("designer");
}
