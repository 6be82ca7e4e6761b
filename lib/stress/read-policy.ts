import { kinds } from "../kinds/catalogue";
import type { LimitForm, Policy, Rule } from "./rule";

type Json = Readonly<Record<string, unknown>>;

/** Reads a policy of the derating reference; what has another shape is a defect of the data and throws. */
export function readPolicy(value: unknown): Policy {
  const policy = record(value);
  return {
    id: text(policy["id"]),
    name: text(policy["name"]),
    rules: list(policy["rules"]).map(readRule),
  };
}

/** Reads one rule, of a published policy or of a circuit file (whose shape the file's reader has checked). */
export function readRule(value: unknown): Rule {
  const rule = record(value);
  const when = rule["when"] === undefined ? {} : record(rule["when"]);
  const source = rule["source"] === undefined ? {} : record(rule["source"]);
  return {
    id: text(rule["id"]),
    kinds: kinds.filter((kind) => list(rule["kinds"]).includes(kind)),
    style: when["style"] === null ? null : optionalText(when["style"]),
    alsoNeeds: [
      ...Object.keys(when).filter((key) => key !== "style"),
      ...(rule["alsoNeeds"] === undefined ? [] : [text(rule["alsoNeeds"])]),
    ],
    variant: rule["variant"] === undefined ? null : record(rule["variant"]),
    quantity: text(rule["quantity"]),
    limit: readForm(rule),
    strict: rule["compare"] === "<",
    advice: rule["severity"] === "advice",
    source: {
      document: optionalText(source["document"]) ?? "",
      clause: optionalText(source["clause"]) ?? "",
      status: optionalText(source["status"]) ?? "given in the circuit file",
    },
  };
}

function readForm(rule: Json): LimitForm {
  switch (rule["form"]) {
    case "ratio":
      return {
        form: "ratio",
        rating: text(rule["rating"]),
        points: list(rule["points"]).map((point) => pair(point)),
        beyond:
          rule["beyond"] === "zero" || rule["beyond"] === "notEvaluated" ? rule["beyond"] : "held",
      };
    case "ceiling":
      return {
        form: "ceiling",
        value: typeof rule["value"] === "number" ? rule["value"] : null,
        valueFrom: optionalText(rule["valueFrom"]) ?? null,
      };
    case "belowRating":
      return { form: "belowRating", rating: text(rule["rating"]), value: number(rule["value"]) };
    case "lowerOf":
      return { form: "lowerOf", terms: list(rule["terms"]).map((term) => readForm(record(term))) };
    case "formula":
      return {
        form: "formula",
        expression: text(rule["expression"]),
        uses: list(rule["uses"]).map(text),
      };
    case "band":
      return { form: "band", rating: text(rule["rating"]), band: pair(rule["band"]) };
    default:
      throw new Error(`A derating rule has the unknown form ${JSON.stringify(rule["form"])}`);
  }
}

function record(value: unknown): Json {
  if (typeof value !== "object" || value === null || Array.isArray(value))
    throw new Error(`A derating policy holds ${JSON.stringify(value)} where an object is wanted`);
  return Object.fromEntries(Object.entries(value));
}

function list(value: unknown): readonly unknown[] {
  if (!Array.isArray(value))
    throw new Error(`A derating policy holds ${JSON.stringify(value)} where a list is wanted`);
  return value;
}

function text(value: unknown): string {
  if (typeof value !== "string")
    throw new Error(`A derating policy holds ${JSON.stringify(value)} where a text is wanted`);
  return value;
}

function optionalText(value: unknown): string | undefined {
  return value === undefined ? undefined : text(value);
}

function number(value: unknown): number {
  if (typeof value !== "number")
    throw new Error(`A derating policy holds ${JSON.stringify(value)} where a number is wanted`);
  return value;
}

function pair(value: unknown): readonly [number, number] {
  const [first, second] = list(value);
  return [number(first), number(second)];
}
