import { meaning } from "../values/nearest-word";
import { quoted } from "../values/read-value";
import type { Fields, Place } from "./place";

const FORMS = ["ratio", "ceiling", "belowRating", "lowerOf", "formula", "band"] as const;
const LIMIT_KEYS = [
  ...["form", "rating", "temperature", "points", "beyond", "value", "valueFrom", "unit"],
  ...["terms", "expression", "uses", "band"],
];
const RULE_KEYS = [
  ...LIMIT_KEYS,
  ...["id", "kinds", "when", "variant", "quantity", "compare", "applied", "severity"],
  ...["source", "note", "alsoNeeds"],
];

/** Checks the shape of a derating rule that the file adds; `kinds` are the part kinds there are. */
export function checkRule(place: Place, kinds: readonly string[]): void {
  const fields = place.fields(RULE_KEYS);
  if (fields === null) return;
  fields.required("id")?.text();
  fields.required("quantity")?.text();
  for (const kind of texts(fields.required("kinds"))) {
    if (kinds.includes(kind.word)) continue;
    const message = `There is no part kind ${quoted(kind.word)}${meaning(kind.word, kinds)}`;
    kind.place.fault("unknownKind", message);
  }
  fields.optional("when")?.entries();
  fields.optional("severity")?.choice(["limit", "advice"]);
  for (const key of ["compare", "applied", "note", "alsoNeeds"]) fields.optional(key)?.text();
  const source = fields.optional("source")?.fields(["document", "clause", "status", "where"]);
  for (const member of source?.members.values() ?? []) member.text();
  checkLimit(fields);
}

/** Checks how the limit is found: each form needs its own keys. */
function checkLimit(fields: Fields): void {
  for (const key of ["rating", "temperature", "unit"]) fields.optional(key)?.text();
  fields.optional("beyond")?.choice(["zero", "notEvaluated"]);
  switch (fields.required("form")?.choice(FORMS)) {
    case "ratio":
      fields.required("rating");
      checkPoints(fields.required("points"));
      break;
    case "ceiling":
      if (fields.optional("valueFrom") === null) checkNumber(fields.required("value"));
      else fields.optional("valueFrom")?.text();
      break;
    case "belowRating":
      fields.required("rating");
      checkNumber(fields.required("value"));
      break;
    case "lowerOf":
      for (const term of fields.required("terms")?.items() ?? []) {
        const members = term.fields(LIMIT_KEYS);
        if (members !== null) checkLimit(members);
      }
      break;
    case "formula":
      fields.required("expression")?.text();
      texts(fields.required("uses"));
      break;
    case "band":
      fields.required("rating");
      checkPair(fields.required("band"));
      break;
    default:
      break;
  }
}

/** [°C, factor] with the temperatures rising. */
function checkPoints(place: Place | null): void {
  const items = place?.items() ?? [];
  if (place !== null && items.length === 0) {
    place.fault("badValue", "A rule needs at least one point of temperature and factor.");
  }
  let last = Number.NEGATIVE_INFINITY;
  for (const item of items) {
    const at = checkPair(item);
    if (at === null) continue;
    if (!(at > last)) item.fault("outOfRange", "The temperatures of the points must rise.");
    last = at;
  }
}

/** Checks a list of two numbers; the first of them. */
function checkPair(place: Place | null): number | null {
  const items = place?.items() ?? null;
  if (place === null || items === null) return null;
  const [first, second] = items.map(checkNumber);
  if (items.length !== 2) return place.fault("wrongType", "Here must stand a list of two numbers.");
  return second === null ? null : (first ?? null);
}

function checkNumber(place: Place | null): number | null {
  if (place === null || typeof place.value === "number") return place?.quantity("ratio") ?? null;
  return place.fault("wrongType", "Here must stand a number.");
}

function texts(place: Place | null): readonly { readonly place: Place; readonly word: string }[] {
  return (place?.items() ?? []).flatMap((item) => {
    const word = item.text();
    return word === null ? [] : [{ place: item, word }];
  });
}
