import type { Place } from "./place";
import { checkRule } from "./read-rule";

/** The derating policies that a file may name. */
const POLICY_IDS = [
  "mil-std-975m",
  "navy-sd-18",
  "rac-severe",
  "rac-benign",
  "mil-dtl-917",
  "common-practice",
] as const;

/** The policy of a file that names none. */
const DEFAULT_POLICY = "common-practice";

/** A policy by id, with what the file adds to it; `stress` reads the rules. */
export interface ReadPolicy {
  readonly use: string;
  readonly variant: unknown;
  readonly rules: readonly unknown[];
}

/** Reads the choice of a derating policy; `kinds` are the part kinds that its rules may name. */
export function readPolicy(place: Place | null, kinds: readonly string[]): ReadPolicy {
  const fields = place?.fields(["use", "variant", "rules"]) ?? null;
  const use = fields?.optional("use")?.choice(POLICY_IDS);
  const rules = fields?.optional("rules")?.items() ?? [];
  const ids = new Set<unknown>();
  for (const rule of rules) {
    checkRule(rule, kinds);
    const id = rule.member("id");
    if (ids.has(id.value))
      id.fault("duplicateName", "Another rule has this id; give each its own.");
    if (id.value !== undefined) ids.add(id.value);
  }
  return {
    use: use ?? DEFAULT_POLICY,
    variant: fields?.optional("variant")?.value ?? null,
    rules: rules.map((rule) => rule.value),
  };
}
