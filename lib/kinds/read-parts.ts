import { measuredByName } from "../circuit/measured-by-name";
import { readName } from "../circuit/names";
import type { Fields, Place } from "../circuit/place";
import { checkPlacing } from "../circuit/read-drawing";
import { meaning } from "../values/nearest-word";
import { anyValue, celsius, halfWidth, positive } from "../values/range";
import { quoted } from "../values/read-value";
import type { BlockEntry } from "./block";
import { catalogue, kinds } from "./catalogue";
import type { Kind } from "./part";
import { readParameters } from "./read-parameters";
import { type AllowedPins, readPins } from "./read-pins";

const EVERY_ENTRY = ["ref", "kind", "pins", "fitted", "note", "id", "at", "turn", "mirror"];
const USE_KEYS = [...EVERY_ENTRY, "block", "set"];
const PART_KEYS = [
  ...EVERY_ENTRY,
  "params",
  "ratings",
  "thermal",
  "style",
  "tolerances",
  "drift",
  "temperature",
];
const ALL_KEYS = [...new Set([...USE_KEYS, ...PART_KEYS, "control", "of", "fit"])];

/** Reads one entry of a block's parts; null where it has no reference designator to know it by. */
export function readEntry(place: Place): BlockEntry | null {
  const written = place.member("kind").value;
  const kind = kinds.find((known) => known === written) ?? null;
  const fields = place.fields(keysOf(written === "block" ? "block" : kind));
  if (fields === null) return null;
  const named = fields.required("ref");
  const ref = named === null ? null : readName(named);
  const common = readCommon(fields);
  if (written === "block") return readUse(fields, ref, common.fitted);
  if (kind === null) return readUnknown(fields, ref);
  return readPart(fields, ref, kind, common);
}

function keysOf(kind: Kind | "block" | null): readonly string[] {
  if (kind === null) return ALL_KEYS;
  if (kind === "block") return USE_KEYS;
  const { refersTo, fitted } = catalogue[kind];
  return [
    ...PART_KEYS,
    ...(refersTo === undefined ? [] : [refersTo]),
    ...(fitted === true ? ["fit"] : []),
  ];
}

function readCommon(fields: Fields) {
  return {
    fitted: fields.optional("fitted")?.flag() ?? true,
    note: fields.optional("note")?.text() ?? null,
    id: fields.optional("id")?.text() ?? null,
    at: checkPlacing(fields),
  };
}

function readUse(fields: Fields, ref: string | null, fitted: boolean): BlockEntry | null {
  const block = fields.required("block")?.text() ?? null;
  // Which pins it has is known once every block is read; a port left out is a net of its own.
  const { pins } = readPins(fields.place, fields.optional("pins"), {
    required: [],
    optional: "any",
  });
  if (ref === null) return null;
  if (block === null) return { entry: "broken", ref, pins, clear: false };
  return { entry: "use", ref, place: fields.place, block, pins, fitted };
}

function readUnknown(fields: Fields, ref: string | null): BlockEntry | null {
  const place = fields.required("kind");
  const word = place?.text() ?? null;
  if (place !== null && word !== null) {
    const hint = meaning(word, [...kinds, "block"]);
    place.fault("unknownKind", `There is no part kind ${quoted(word)}${hint}`);
  }
  const { pins, clear } = readPins(fields.place, fields.optional("pins"), {
    required: [],
    optional: "any",
  });
  return ref === null ? null : { entry: "broken", ref, pins, clear };
}

function readPart(
  fields: Fields,
  ref: string | null,
  kind: Kind,
  common: ReturnType<typeof readCommon>,
): BlockEntry | null {
  const { place } = fields;
  const description = catalogue[kind];
  const { pins, clear, good } = readPins(place, fields.optional("pins"), allowedPins(kind));
  const parameters = readParameters(kind, {
    part: place,
    params: fields.optional("params"),
    tolerances: fields.optional("tolerances"),
    fit: fields.optional("fit"),
  });
  const refers = description.refersTo;
  const control = refers === "control" ? (fields.required("control")?.text() ?? null) : null;
  const of = refers === "of" ? readPair(fields.required("of")) : null;
  const judged = readJudged(fields);
  const resolved = refers === undefined || control !== null || of !== null;
  if (ref === null) return null;
  if (!good || parameters === null || !resolved) return { entry: "broken", ref, pins, clear };
  return {
    entry: "part",
    ref,
    kind,
    place,
    pins: inOrder(pins, description.pins),
    parameters: parameters.values,
    statedTolerances: parameters.statedTolerances,
    control,
    of,
    ...judged,
    ...common,
  };
}

function allowedPins(kind: Kind): AllowedPins {
  const { pins, optionalPins = [] } = catalogue[kind];
  if (pins === "any") return { required: [], optional: "any" };
  return { required: pins.filter((pin) => !optionalPins.includes(pin)), optional: optionalPins };
}

/** The pins in the order of the kind, whatever order the file has: a part's voltage is first minus second. */
function inOrder(
  pins: ReadonlyMap<string, string | null>,
  order: readonly string[] | "any",
): ReadonlyMap<string, string | null> {
  if (order === "any") return pins;
  return new Map(
    order.flatMap((pin) => {
      const net = pins.get(pin);
      return net === undefined ? [] : [[pin, net] as const];
    }),
  );
}

/** What judging a part needs: ratings, thermal resistance, style, drift, its own temperature. */
function readJudged(fields: Fields) {
  const thermal = fields.optional("thermal")?.fields(["junctionToAmbient"]);
  return {
    ratings: readRatings(fields.optional("ratings")),
    junctionToAmbient:
      thermal?.required("junctionToAmbient")?.quantity("thermalResistance", positive) ?? null,
    style: fields.optional("style")?.text() ?? null,
    drift: readDrift(fields.optional("drift")),
    temperature: fields.optional("temperature")?.quantity("temperature", celsius) ?? null,
  };
}

function readRatings(place: Place | null): ReadonlyMap<string, number> {
  const ratings = new Map<string, number>();
  for (const [name, rating] of place?.entries() ?? []) {
    const quantity = measuredByName(name);
    if (quantity === null) {
      const message = `${quoted(name)} is not a rating; its last word must say what it measures, as in "reverseVoltage".`;
      rating.fault("unknownKey", message);
      continue;
    }
    const value = rating.quantity(quantity, positive);
    if (value !== null) ratings.set(name, value);
  }
  return ratings;
}

function readDrift(place: Place | null): { bias: number; random: number } | null {
  const fields = place?.fields(["bias", "random"]) ?? null;
  if (fields === null) return null;
  const bias = fields.optional("bias")?.quantity("fraction", anyValue) ?? 0;
  const random = fields.optional("random")?.quantity("fraction", halfWidth) ?? 0;
  return { bias, random };
}

function readPair(place: Place | null): readonly [string, string] | null {
  const items = place?.items() ?? null;
  if (place === null || items === null) return null;
  const [first, second, more] = items.map((item) => item.text());
  if (first === undefined || second === undefined || more !== undefined) {
    return place.fault("wrongType", "A coupling is of two inductors; list their references.");
  }
  return first === null || second === null ? null : [first, second];
}
