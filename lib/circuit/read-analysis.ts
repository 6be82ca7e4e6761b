import { celsius, positive } from "../values/range";
import { quoted } from "../values/read-value";
import type { Addresses } from "./addresses";
import type { Analysis } from "./analysis";
import type { Fields, Place } from "./place";

const TYPES = ["operatingPoint", "sweep", "frequencyResponse", "transient"] as const;
const MOST_POINTS = 100_000;
const MOST_POINTS_PER_DECADE = 10_000;
const DEFAULT_STEPS = 500;

/** Reads what is computed in a condition. */
export function readAnalysis(place: Place, addresses: Addresses): Analysis | null {
  const entries = place.entries();
  if (entries === null) return null;
  const named = entries.find(([key]) => key === "type")?.[1];
  if (named === undefined) {
    return place.fault("missingKey", 'The key "type" is missing here; add it.');
  }
  const type = named.choice(TYPES);
  return type === null ? null : readers[type](place, addresses);
}

const readers: {
  readonly [Type in Analysis["type"]]: (place: Place, addresses: Addresses) => Analysis | null;
} = {
  operatingPoint: (place) => (place.fields(["type"]) === null ? null : { type: "operatingPoint" }),
  sweep: readSweep,
  frequencyResponse: readFrequencyResponse,
  transient: readTransient,
};

function readSweep(place: Place, addresses: Addresses): Analysis | null {
  const fields = place.fields(["type", "of", "from", "to", "points"]);
  if (fields === null) return null;
  const of = fields.required("of");
  const address = of?.text() ?? null;
  const swept =
    address === "ambient"
      ? ({ quantity: "temperature", range: celsius } as const)
      : of === null || address === null
        ? null
        : addresses.parameter(of, address);
  const from = fields.required("from");
  const to = fields.required("to");
  const points = fields.required("points")?.count(2, MOST_POINTS) ?? null;
  if (swept === null || address === null || points === null) return null;
  const first = from?.quantity(swept.quantity, swept.range) ?? null;
  const last = to?.quantity(swept.quantity, swept.range) ?? null;
  if (first === null || last === null) return null;
  return { type: "sweep", of: address, from: first, to: last, points };
}

function readFrequencyResponse(place: Place): Analysis | null {
  const fields = place.fields(["type", "from", "to", "pointsPerDecade"]);
  if (fields === null) return null;
  const from = fields.required("from")?.quantity("frequency", positive) ?? null;
  const to = fields.required("to")?.quantity("frequency", positive) ?? null;
  const pointsPerDecade =
    fields.required("pointsPerDecade")?.count(1, MOST_POINTS_PER_DECADE) ?? null;
  if (from === null || to === null) return null;
  if (!(from < to)) {
    const message = '"from" must be below "to".';
    return (fields.optional("from") ?? place).fault("outOfRange", message);
  }
  return pointsPerDecade === null ? null : { type: "frequencyResponse", from, to, pointsPerDecade };
}

function readTransient(place: Place, addresses: Addresses): Analysis | null {
  const fields = place.fields(["type", "until", "maxStep", "record", "from", "initial"]);
  if (fields === null) return null;
  const until = fields.required("until")?.quantity("time", positive) ?? null;
  const maxStep = fields.optional("maxStep")?.quantity("time", positive);
  const record = readRecord(fields.optional("record"), addresses);
  const fromRest = fields.optional("from")?.choice(["rest"]) === "rest";
  const initial = readInitial(fields, addresses);
  if (until === null || maxStep === null) return null;
  return {
    type: "transient",
    until,
    maxStep: maxStep ?? until / DEFAULT_STEPS,
    record,
    fromRest,
    initial,
  };
}

function readRecord(place: Place | null, addresses: Addresses): readonly string[] | null {
  if (place === null) return null;
  return (place.items() ?? []).flatMap((item) => {
    const net = item.text();
    return net !== null && addresses.net(item, net) ? [net] : [];
  });
}

function readInitial(fields: Fields, addresses: Addresses): Readonly<Record<string, number>> {
  const entries = fields.optional("initial")?.entries() ?? [];
  const read = entries.flatMap(([address, place]) => {
    const quantity = addresses.state(place, address);
    const value = quantity === null ? null : place.quantity(quantity);
    return value === null ? [] : [[address, value] as const];
  });
  return Object.fromEntries(read);
}

/** Takes `X1/R1.resistance` apart; null (reported) where it is not one part and one name. */
export function splitAddress(
  place: Place,
  address: string,
): { readonly part: string; readonly name: string } | null {
  const [part = "", name = "", more] = address.split(".");
  if (part !== "" && name !== "" && more === undefined) return { part, name };
  return place.fault(
    "badValue",
    `${quoted(address)} is not an address; write a part, a dot and a parameter, such as "R1.resistance".`,
  );
}
