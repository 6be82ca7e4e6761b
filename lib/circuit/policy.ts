import type { Place } from "./place";

/** The derating policies that a file may name. */
export const policyIds = [
  "mil-std-975m",
  "navy-sd-18",
  "rac-severe",
  "rac-benign",
  "mil-dtl-917",
  "common-practice",
] as const;

/** The policy of a file that names none. */
export const defaultPolicy = "common-practice";

/** A policy by id, with what the file adds to it; `stress` reads the rules. */
export interface ReadPolicy {
  readonly use: string;
  readonly variant: unknown;
  readonly rules: readonly unknown[];
}

/** Reads the choice of a derating policy. */
export function readPolicy(place: Place | null): ReadPolicy {
  const fields = place?.fields(["use", "variant", "rules"]) ?? null;
  const use = fields?.optional("use")?.choice(policyIds);
  const rules = fields?.optional("rules")?.items() ?? [];
  for (const rule of rules) {
    const [, id] = rule.entries()?.find(([key]) => key === "id") ?? [];
    if (id === undefined) rule.fault("missingKey", 'A rule needs an "id".');
    else id.text();
  }
  return {
    use: use ?? defaultPolicy,
    variant: fields?.optional("variant")?.value ?? null,
    rules: rules.map((rule) => rule.value),
  };
}
