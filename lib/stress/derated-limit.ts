import type { Part } from "../kinds/part";
import type { LimitForm, Rule } from "./rule";
import { formulaValue } from "./rules/formula";
import { piecewise } from "./rules/ratio";

/** The bounds that a rule sets, or what is missing to say them. Bounds in the quantity's unit. */
export type DeratedLimit =
  | {
      readonly kind: "bounds";
      readonly least: number | null;
      readonly most: number;
      readonly rated: number | null;
    }
  | { readonly kind: "missing"; readonly needs: readonly string[] };

/** What a limit may depend on besides the part. */
export interface LimitSetting {
  /** Temperature the rating is taken at, degrees Celsius. */
  readonly temperature: number;
  /** Other applied quantities of the part in the same condition. */
  readonly applied: Readonly<Record<string, number>>;
  /** The rules of the policy, for formulas that use another rule's limit. */
  readonly rules: readonly Rule[];
}

/** The derated limit of a part under a form of limit. */
export function deratedLimit(form: LimitForm, part: Part, setting: LimitSetting): DeratedLimit {
  switch (form.form) {
    case "ratio": {
      const rated = part.ratings[form.rating];
      if (rated === undefined) return missing(`rating ${form.rating}`);
      const factor = piecewise(form.points, form.beyond, setting.temperature);
      return factor === null
        ? missing(`a factor at ${setting.temperature} °C: the rule says none there`)
        : { kind: "bounds", least: null, most: rated * factor, rated };
    }
    case "ceiling": {
      const most = form.value ?? setting.applied[(form.valueFrom ?? "").replace("applied:", "")];
      return most === undefined
        ? missing(form.valueFrom ?? "a value")
        : { kind: "bounds", least: null, most, rated: null };
    }
    case "belowRating": {
      const rated = part.ratings[form.rating];
      return rated === undefined
        ? missing(`rating ${form.rating}`)
        : { kind: "bounds", least: null, most: rated - form.value, rated };
    }
    case "band": {
      const rated = part.ratings[form.rating];
      return rated === undefined
        ? missing(`rating ${form.rating}`)
        : { kind: "bounds", least: rated * form.band[0], most: rated * form.band[1], rated };
    }
    case "lowerOf":
      return lowest(form.terms.map((term) => deratedLimit(term, part, setting)));
    case "formula":
      return formulaLimit(form, part, setting);
  }
}

function missing(...needs: readonly string[]): DeratedLimit {
  return { kind: "missing", needs };
}

function lowest(limits: readonly DeratedLimit[]): DeratedLimit {
  const needs = limits.flatMap((limit) => (limit.kind === "missing" ? limit.needs : []));
  if (needs.length > 0) return missing(...needs);
  const bounds = limits.filter((limit) => limit.kind === "bounds");
  const best = bounds.toSorted((a, b) => a.most - b.most)[0];
  return best ?? missing("a term");
}

function formulaLimit(
  form: Extract<LimitForm, { form: "formula" }>,
  part: Part,
  setting: LimitSetting,
): DeratedLimit {
  const values = new Map<string, number>();
  const needs: string[] = [];
  const parameters = new Map<string, unknown>(Object.entries(part.params));
  for (const use of form.uses) {
    const [from = "", name = ""] = use.split(":");
    const value = usedValue(from, name);
    if (typeof value === "number") values.set(variableOf(from, name), value);
    else needs.push(...value);
  }
  if (needs.length > 0) return missing(...needs);
  const most = formulaValue(form.expression, values);
  return most === null
    ? missing(`a formula that can be read: ${form.expression}`)
    : { kind: "bounds", least: null, most, rated: null };

  function usedValue(from: string, name: string): number | readonly string[] {
    if (from === "rating") return part.ratings[name] ?? [`rating ${name}`];
    if (from === "param") {
      const value = parameters.get(name);
      return typeof value === "number" ? value : [`parameter ${name}`];
    }
    const rule = setting.rules.find((one) => one.id === name);
    if (rule === undefined) return [`rule ${name}`];
    if (typeof rule.style === "string" && rule.style !== part.style)
      return [`style ${rule.style} for rule ${name}`];
    const limit = deratedLimit(rule.limit, part, setting);
    return limit.kind === "bounds" ? limit.most : limit.needs;
  }
}

/** How a formula calls what it uses: a rule's limit is `allowedPower`, a rating `ratedPower`, a parameter its own name. */
function variableOf(from: string, name: string): string {
  if (from === "rule") return "allowedPower";
  if (from === "rating" && name === "power") return "ratedPower";
  return name === "resistance25" ? "resistance" : name;
}
