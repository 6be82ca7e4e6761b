import type { Decision } from "./review-state";

export type Check = Extract<Decision, { kind: "check" }>;

/** The check that stands on each item of a revision, by the item: the latest word counts, and an uncheck takes it away. */
export function latestChecks(
  decisions: readonly Decision[],
  revision: string,
): ReadonlyMap<string, Check> {
  const checks = new Map<string, Check>();
  for (const decision of decisions) {
    if (decision.kind === "check" && decision.revision === revision)
      checks.set(decision.item, decision);
    if (decision.kind === "uncheck" && decision.revision === revision) checks.delete(decision.item);
  }
  return checks;
}
