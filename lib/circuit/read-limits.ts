import type { Quantity } from "../values/quantity";
import { quoted } from "../values/read-value";
import type { Addresses } from "./addresses";
import type { Limit } from "./limit";
import { measuredByName } from "./measured-by-name";
import type { Fields, Place } from "./place";

const KEYS = ["net", "between", "part", "quantity", "min", "max", "condition"];

/** Reads the limits; `conditions` are the names they may be tied to. */
export function readLimits(
  place: Place,
  addresses: Addresses,
  conditions: ReadonlySet<string>,
): readonly Limit[] {
  return (place.items() ?? []).flatMap((item) => readLimit(item, addresses, conditions) ?? []);
}

function readLimit(
  place: Place,
  addresses: Addresses,
  conditions: ReadonlySet<string>,
): Limit | null {
  const fields = place.fields(KEYS);
  if (fields === null) return null;
  const subject = readSubject(fields, addresses);
  const quantity = subject?.quantity ?? null;
  const min = readBound(fields, "min", quantity);
  const max = readBound(fields, "max", quantity);
  if (fields.optional("min") === null && fields.optional("max") === null) {
    place.fault("missingKey", 'A limit needs "min", "max" or both.');
  }
  if (min !== null && max !== null && min > max) {
    place.fault("outOfRange", `"min" is above "max"; nothing can meet this limit.`);
  }
  const condition = fields.optional("condition")?.text() ?? null;
  if (condition !== null && !conditions.has(condition)) {
    const message = `There is no condition ${quoted(condition)}; name one of the file.`;
    fields.optional("condition")?.fault("badValue", message);
  }
  return subject === null ? null : { of: subject.of, min, max, condition };
}

interface Subject {
  readonly of: Limit["of"];
  readonly quantity: Quantity | null;
}

/** What the limit bounds: exactly one of a net, two nets, a part's quantity. */
function readSubject(fields: Fields, addresses: Addresses): Subject | null {
  const given = ["net", "between", "part"].filter((key) => fields.optional(key) !== null);
  const [form] = given;
  if (form === undefined || given.length > 1) {
    return fields.place.fault(
      form === undefined ? "missingKey" : "badValue",
      'A limit bounds exactly one of "net", "between" and "part".',
    );
  }
  const quantity = fields.optional("quantity");
  if (form !== "part" && quantity !== null) {
    quantity.fault("unknownKey", 'Only a limit of a "part" has a "quantity"; leave it out.');
  }
  const place = fields.required(form);
  if (place === null) return null;
  if (form === "net") {
    const net = readNet(place, addresses);
    return net === null ? null : { of: { net }, quantity: "voltage" };
  }
  return form === "part" ? readPartQuantity(place, fields, addresses) : readPair(place, addresses);
}

function readPair(place: Place, addresses: Addresses): Subject | null {
  const items = place.items();
  if (items === null) return null;
  const [first, second, more] = items.map((item) => ({ net: readNet(item, addresses) }));
  if (first === undefined || second === undefined || more !== undefined) {
    return place.fault("wrongType", '"between" is a list of two nets.');
  }
  if (first.net === null || second.net === null) return null;
  return { of: { between: [first.net, second.net] }, quantity: "voltage" };
}

function readNet(place: Place, addresses: Addresses): string | null {
  const net = place.text();
  return net !== null && addresses.net(place, net) ? net : null;
}

function readPartQuantity(place: Place, fields: Fields, addresses: Addresses): Subject | null {
  const named = fields.required("quantity");
  const part = place.text();
  const known = part !== null && addresses.part(place, part);
  const quantity = named?.text() ?? null;
  if (named === null || quantity === null) return null;
  const measured = measuredByName(quantity);
  if (measured === null) {
    return named.fault("badValue", `${quoted(quantity)} is not a quantity of a part.`);
  }
  return known ? { of: { part, quantity }, quantity: measured } : null;
}

function readBound(fields: Fields, key: string, quantity: Quantity | null): number | null {
  const place = fields.optional(key);
  return place === null || quantity === null ? null : place.quantity(quantity);
}
