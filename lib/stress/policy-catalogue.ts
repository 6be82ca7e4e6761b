import type { PolicyChoice } from "../kinds/circuit";
import derating from "./derating.json";
import { readPolicy, readRule } from "./read-policy";
import type { Policy, Rule } from "./rule";

const policies: readonly Policy[] = derating.policies.map(readPolicy);

/** The rules that a circuit file chooses: a published policy with the file's own rules added, or replacing by id. */
export function chosenPolicy(choice: PolicyChoice): Policy {
  const published = policies.find((policy) => policy.id === choice.use);
  const own = choice.rules.map(readRule);
  const replaced = new Set(own.map((rule) => rule.id));
  const kept = (published?.rules ?? []).filter((rule) => !replaced.has(rule.id));
  return {
    id: choice.use,
    name: published?.name ?? choice.use,
    rules: [...kept, ...own].filter((rule) => fitsVariant(rule, choice.variant)),
  };
}

/** A rule for one variant serves only where that variant is chosen. */
function fitsVariant(rule: Rule, chosen: unknown): boolean {
  if (rule.variant === null) return true;
  if (typeof chosen !== "object" || chosen === null) return false;
  const wanted = new Map<string, unknown>(Object.entries(chosen));
  return Object.entries(rule.variant).every(([key, value]) => wanted.get(key) === value);
}
