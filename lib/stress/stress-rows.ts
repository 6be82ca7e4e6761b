import type { Circuit, Condition } from "../kinds/circuit";
import type { Part } from "../kinds/part";
import type { ConditionResult } from "../mna/solution";
import type { Verdict } from "../values/verdict";
import { type AppliedQuantities, appliedQuantities, hottest } from "./applied";
import type { StressRow } from "./circuit-result";
import { type DeratedLimit, deratedLimit } from "./derated-limit";
import { chosenPolicy } from "./policy-catalogue";
import type { Policy, Rule } from "./rule";

/**
 * Every part judged by every rule of the policy that is for it: one row for each part and rule, at the
 * condition with the least margin (or, with `everyCondition`, in each condition). Connectors and test
 * points have no current in the model and are skipped.
 */
export function stressRows(
  circuit: Circuit,
  results: readonly ConditionResult[],
  everyCondition = false,
): readonly StressRow[] {
  const policy = chosenPolicy(circuit.policy);
  return circuit.parts
    .filter((part) => part.kind !== "connector" && part.kind !== "testPoint")
    .flatMap((part) =>
      rulesFor(part, policy).flatMap((rule) => {
        const rows = circuit.conditions.map((condition, index) =>
          judgedRow(part, rule, policy, condition, results[index]),
        );
        return everyCondition ? rows : rows.toSorted((a, b) => order(a) - order(b)).slice(0, 1);
      }),
    );
}

/** A failing row comes first, an unknown one next, then the least margin. */
function order(row: StressRow): number {
  if (row.verdict === "fail") return -1e9 + (row.margin ?? -1);
  if (row.verdict === "unknown") return -1e6;
  return row.margin ?? Number.MAX_VALUE;
}

/** The rules for a part: by kind and style. One that asks for a style the part does not give stands for all of its quantity. */
function rulesFor(part: Part, policy: Policy): readonly Rule[] {
  const ofKind = policy.rules.filter((rule) => rule.kinds.includes(part.kind));
  const fitting = ofKind.filter(
    (rule) => rule.style === undefined || rule.style === (part.style ?? null),
  );
  if (part.style !== null) return fitting;
  const judged = new Set(fitting.map((rule) => rule.quantity));
  const asking = ofKind.filter((rule) => {
    if (typeof rule.style !== "string" || judged.has(rule.quantity)) return false;
    // A style by which a kind is told apart only for one quantity would be asked for in vain otherwise.
    judged.add(rule.quantity);
    // A part that nothing else judges is asked all the same: it must not pass by saying nothing.
    return fitting.length === 0 || part.ratings[ratingOf(rule)] !== undefined;
  });
  return [...fitting, ...asking];
}

function ratingOf(rule: Rule): string {
  return "rating" in rule.limit ? rule.limit.rating : rule.quantity;
}

function judgedRow(
  part: Part,
  rule: Rule,
  policy: Policy,
  condition: Condition,
  result: ConditionResult | undefined,
): StressRow {
  const own = condition.parts.find((one) => one.path === part.path) ?? part;
  const applied = result === undefined ? null : appliedQuantities(own, condition, result);
  const limit = deratedLimit(rule.limit, own, {
    temperature: hottest(own, condition),
    applied: applied?.largest ?? {},
    rules: policy.rules,
  });
  const needs = [
    ...(typeof rule.style === "string" && part.style === null ? ["style"] : []),
    ...rule.alsoNeeds,
    ...(limit.kind === "missing" ? limit.needs : []),
  ];
  const value = applied === null ? null : appliedTo(rule, applied);
  const unsolved = applied === null ? [`a solution of ${condition.name}`] : [];
  const unstated =
    applied !== null && value === null
      ? [
          rule.quantity === "junctionTemperature"
            ? "thermal junctionToAmbient"
            : `quantity ${rule.quantity}`,
        ]
      : [];
  const judged = verdictOf(rule, limit, value);
  const allNeeds = [...needs, ...unstated, ...unsolved];
  const verdict: Verdict = allNeeds.length > 0 ? "unknown" : judged.verdict;
  return {
    part: part.path,
    quantity: rule.quantity,
    condition: condition.name,
    applied: value,
    rated: limit.kind === "bounds" ? limit.rated : null,
    limit: judged.bound,
    ratio:
      value !== null && limit.kind === "bounds" && limit.rated !== null && limit.rated !== 0
        ? value / limit.rated
        : null,
    margin: verdict === "unknown" ? null : judged.margin,
    verdict,
    rule: { policy: policy.id, id: rule.id, ...rule.source },
    ...(allNeeds.length > 0 && { needs: allNeeds }),
  };
}

/** A band is a statement about a steady state: a coil that is being switched off passes through zero by intent. */
function appliedTo(rule: Rule, applied: AppliedQuantities): number | null {
  const from = rule.limit.form === "band" ? applied.steady : applied.largest;
  return from[rule.quantity] ?? null;
}

interface Judged {
  readonly verdict: Verdict;
  /** The bound that is nearest. */
  readonly bound: number | null;
  readonly margin: number | null;
}

function verdictOf(rule: Rule, limit: DeratedLimit, applied: number | null): Judged {
  if (limit.kind === "missing" || applied === null)
    return { verdict: "unknown", bound: limit.kind === "bounds" ? limit.most : null, margin: null };
  const { least, most } = limit;
  // Written so that NaN fails.
  const underMost = rule.strict ? applied < most : applied <= most;
  const overLeast = least === null || applied >= least;
  const verdict: Verdict = underMost && overLeast ? "pass" : rule.advice ? "pass" : "fail";
  const upper = applied > 0 ? most / applied - 1 : null;
  const lower = least !== null && least > 0 ? applied / least - 1 : null;
  if (lower !== null && (upper === null || lower < upper))
    return { verdict, bound: least, margin: lower };
  return { verdict, bound: most, margin: upper };
}
