import type { Quantity } from "../values/quantity";
import { notNegative, positive, type Range } from "../values/range";
import type { Waveform } from "./analysis";
import type { Fields, Place } from "./place";

const SHAPES = ["pulse", "sine", "points", "step"] as const;

const NEVER = Number.POSITIVE_INFINITY;

/** Reads a source's course in time; `quantity` is what its values measure. */
export function readWaveform(place: Place, quantity: Quantity): Waveform | null {
  const fields = place.fields(SHAPES);
  if (fields === null) return null;
  const given = SHAPES.filter((shape) => fields.optional(shape) !== null);
  const [shape] = given;
  if (shape === undefined || given.length > 1) {
    return place.fault(
      given.length > 1 ? "badValue" : "missingKey",
      'A waveform has exactly one of "pulse", "sine", "points" and "step".',
    );
  }
  const course = fields.required(shape);
  return course === null ? null : readers[shape](course, quantity);
}

const readers: {
  readonly [Shape in (typeof SHAPES)[number]]: (
    place: Place,
    quantity: Quantity,
  ) => Waveform | null;
} = { pulse: readPulse, sine: readSine, points: readPoints, step: readStep };

function readPulse(place: Place, quantity: Quantity): Waveform | null {
  const fields = place.fields(["low", "high", "delay", "rise", "fall", "width", "period"]);
  if (fields === null) return null;
  const low = required(fields, "low", quantity);
  const high = required(fields, "high", quantity);
  const delay = optional(fields, "delay", "time", 0, notNegative);
  const rise = optional(fields, "rise", "time", 0, notNegative);
  const fall = optional(fields, "fall", "time", 0, notNegative);
  const width = optional(fields, "width", "time", NEVER, notNegative);
  const period = optional(fields, "period", "time", NEVER, positive);
  if (low === null || high === null || delay === null || rise === null) return null;
  if (fall === null || width === null || period === null) return null;
  if (period !== NEVER && !(period >= rise + width + fall)) {
    return (fields.optional("period") ?? place).fault(
      "outOfRange",
      Number.isFinite(width)
        ? "The period is shorter than rise, width and fall together."
        : 'A pulse with a period needs a "width".',
    );
  }
  return {
    shape: "pulse",
    low,
    high,
    delay,
    rise,
    fall,
    width,
    period: period === NEVER ? null : period,
  };
}

function readSine(place: Place, quantity: Quantity): Waveform | null {
  const fields = place.fields(["offset", "amplitude", "frequency", "delay", "phase"]);
  if (fields === null) return null;
  const offset = optional(fields, "offset", quantity, 0);
  const amplitude = required(fields, "amplitude", quantity);
  const frequency = required(fields, "frequency", "frequency", positive);
  const delay = optional(fields, "delay", "time", 0, notNegative);
  const phase = optional(fields, "phase", "angle", 0);
  if (offset === null || amplitude === null || frequency === null) return null;
  if (delay === null || phase === null) return null;
  return { shape: "sine", offset, amplitude, frequency, delay, phase };
}

function readPoints(place: Place, quantity: Quantity): Waveform | null {
  const items = place.items();
  if (items === null) return null;
  if (items.length === 0) return place.fault("badValue", "A waveform needs at least one point.");
  const points: (readonly [number, number])[] = [];
  let last = Number.NEGATIVE_INFINITY;
  for (const item of items) {
    const point = readPoint(item, quantity);
    if (point === null) continue;
    if (!(point[0] > last)) {
      item.fault("outOfRange", "The times of the points must rise; this one does not.");
    }
    last = point[0];
    points.push(point);
  }
  return points.length === items.length ? { shape: "points", points } : null;
}

function readPoint(place: Place, quantity: Quantity): readonly [number, number] | null {
  const pair = place.items();
  if (pair === null) return null;
  const [at, to, more] = pair;
  if (at === undefined || to === undefined || more !== undefined) {
    return place.fault("wrongType", "A point is a list of two: its time and its value.");
  }
  const time = at.quantity("time");
  const value = to.quantity(quantity);
  return time === null || value === null ? null : [time, value];
}

function readStep(place: Place, quantity: Quantity): Waveform | null {
  const fields = place.fields(["from", "to", "at"]);
  if (fields === null) return null;
  const from = required(fields, "from", quantity);
  const to = required(fields, "to", quantity);
  const at = required(fields, "at", "time");
  if (from === null || to === null || at === null) return null;
  return { shape: "step", from, to, at };
}

function required(fields: Fields, key: string, quantity: Quantity, range?: Range): number | null {
  return fields.required(key)?.quantity(quantity, range) ?? null;
}

/** The value, or what stands for one left out; null after a fault. */
function optional(
  fields: Fields,
  key: string,
  quantity: Quantity,
  otherwise: number,
  range?: Range,
): number | null {
  const place = fields.optional(key);
  return place === null ? otherwise : place.quantity(quantity, range);
}
