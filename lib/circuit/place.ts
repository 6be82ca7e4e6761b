import { meaning } from "../values/nearest-word";
import type { FileProblemCode } from "../values/problem";
import { type Quantity, quantities } from "../values/quantity";
import { anyValue, type Range, rangeInWords, within } from "../values/range";
import { quoted, type ReadValue, readValue } from "../values/read-value";
import { below } from "./pointer";
import type { Reading } from "./reading";

/**
 * A value in the file and where it stands. Each question asked of it (`text`, `quantity`, `items` …) gives the
 * answer, or null after reporting why there is none; so a reader goes on to whatever else can be read,
 * and all problems come out at once.
 */
export class Place {
  constructor(
    readonly value: unknown,
    readonly pointer: string,
    readonly reading: Reading,
  ) {}

  /** Reports a problem here. Always null, to be returned. */
  fault(code: FileProblemCode, message: string): null {
    this.reading.report(code, message, this.pointer);
    return null;
  }

  /** The place of a member, there or not. */
  member(key: string | number): Place {
    return new Place(memberOf(this.value, key), below(this.pointer, key), this.reading);
  }

  /** An object with these keys and no others; null (reported) where it is no object. */
  fields(known: readonly string[]): Fields | null {
    const entries = this.entries();
    if (entries === null) return null;
    for (const [key, place] of entries) {
      if (known.includes(key)) continue;
      const hint = meaning(key, known);
      place.fault("unknownKey", `There is no key ${quoted(key)} here${hint}`);
    }
    return new Fields(this, new Map(entries));
  }

  /** An object whose keys are names, in the order written. */
  entries(): (readonly [string, Place])[] | null {
    const { value } = this;
    if (!isRecord(value)) return this.#wrong("an object");
    return Object.keys(value).map((key) => [key, this.member(key)]);
  }

  items(): Place[] | null {
    const { value } = this;
    if (!Array.isArray(value)) return this.#wrong("a list");
    return Array.from(value, (_, index) => this.member(index));
  }

  text(): string | null {
    return typeof this.value === "string" ? this.value : this.#wrong("a text");
  }

  flag(): boolean | null {
    return typeof this.value === "boolean" ? this.value : this.#wrong("true or false");
  }

  /** One of a few words. */
  choice<Word extends string>(words: readonly Word[]): Word | null {
    const text = this.text();
    if (text === null) return null;
    const found = words.find((word) => word === text);
    if (found !== undefined) return found;
    return this.fault("badValue", `${quoted(text)} is not one of ${listed(words)}.`);
  }

  /** A whole number, written as a JSON number. */
  count(least: number, most: number): number | null {
    const { value } = this;
    if (typeof value !== "number") return this.#wrong("a whole number");
    if (!Number.isSafeInteger(value)) {
      return this.fault("badValue", `The number ${value} is not a whole one.`);
    }
    if (value >= least && value <= most) return value;
    const bounds = `at least ${least} and at most ${most}`;
    return this.fault("outOfRange", `The number ${value} is out of range; it must be ${bounds}.`);
  }

  /** A value of this quantity that names no tolerance. */
  quantity(quantity: Quantity, range: Range = anyValue): number | null {
    const read = this.toleranced(quantity, range);
    if (read === null) return null;
    if (read.tolerance === null) return read.value;
    return this.fault("badValue", "A tolerance letter has no meaning here; leave it out.");
  }

  /** A value of this quantity, with the tolerance that a letter code may name. */
  toleranced(quantity: Quantity, range: Range = anyValue): ReadValue | null {
    const read = this.#value(quantity);
    if (read === null) return null;
    if (!within(range, read.value)) {
      const found = `The value ${this.#written()} is out of range`;
      const { name } = quantities[quantity];
      return this.fault("outOfRange", `${found}; ${name} here must be ${rangeInWords(range)}.`);
    }
    this.reading.note(this.pointer, read.value);
    return read;
  }

  #value(quantity: Quantity): ReadValue | null {
    const { value } = this;
    if (typeof value === "string") {
      const read = readValue(value, quantity);
      return read.ok ? read.value : this.fault(read.error.code, read.error.message);
    }
    if (typeof value !== "number") {
      return this.#wrong(`${quantities[quantity].name}, a number or a text`);
    }
    if (Number.isFinite(value)) return { value, tolerance: null };
    return this.fault("badValue", "The number is not finite; write one that is.");
  }

  #written(): string {
    return typeof this.value === "string" ? quoted(this.value) : String(this.value);
  }

  #wrong(expected: string): null {
    return this.fault("wrongType", `Here must stand ${expected}, not ${typeInWords(this.value)}.`);
  }
}

/** The members of an object whose keys are fixed. */
export class Fields {
  constructor(
    readonly place: Place,
    readonly members: ReadonlyMap<string, Place>,
  ) {}

  /** The member, or null where it is left out. */
  optional(key: string): Place | null {
    return this.members.get(key) ?? null;
  }

  /** The member, or null after reporting that it is missing. */
  required(key: string): Place | null {
    const member = this.members.get(key);
    if (member !== undefined) return member;
    return this.place.fault("missingKey", `The key "${key}" is missing here; add it.`);
  }
}

/** Whether the value is a JSON object. */
export function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

function memberOf(value: unknown, key: string | number): unknown {
  if (Array.isArray(value)) return value[Number(key)];
  return isRecord(value) && Object.hasOwn(value, key) ? value[key] : undefined;
}

/** Words in quotation marks with commas: `"a", "b" or "c"`. */
function listed(words: readonly string[]): string {
  const all = words.map((word) => `"${word}"`);
  const last = all.pop() ?? "";
  return all.length === 0 ? last : `${all.join(", ")} or ${last}`;
}

function typeInWords(value: unknown): string {
  if (value === null || value === undefined) return String(value);
  if (Array.isArray(value)) return "a list";
  if (typeof value === "string") return "a text";
  if (typeof value === "object") return "an object";
  return typeof value === "boolean" ? String(value) : `a ${typeof value}`;
}
