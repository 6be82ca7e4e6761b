import type { Place } from "../circuit/place";
import { readWaveform } from "../circuit/read-waveform";
import { meaning } from "../values/nearest-word";
import { halfWidth } from "../values/range";
import { quoted } from "../values/read-value";
import { catalogue } from "./catalogue";
import { readFit } from "./fit-junction";
import type { Parameter, ParameterValue } from "./parameter";
import type { Kind } from "./part";

/** A parameter as the file gives it, with the half-width that a letter code may name. */
export interface GivenParameter {
  readonly value: ParameterValue;
  readonly tolerance: number | null;
}

/** Reads one parameter; null where it could not be. */
export function readParameter(parameter: Parameter, place: Place): GivenParameter | null {
  switch (parameter.form) {
    case "quantity":
      if (place.value === null && parameter.default === null) {
        return { value: null, tolerance: null };
      }
      return place.toleranced(parameter.quantity, parameter.range);
    case "flag":
      return only(place.flag());
    case "choice":
      return only(place.choice(parameter.words));
    case "waveform":
      if (place.value === null) return { value: null, tolerance: null };
      return only(readWaveform(place, parameter.quantity));
  }
}

function only(value: ParameterValue): GivenParameter | null {
  return value === null ? null : { value, tolerance: null };
}

/** The parameters of a part, and the half-widths that the file states for them. */
export interface ReadParameters {
  readonly values: ReadonlyMap<string, ParameterValue>;
  readonly statedTolerances: ReadonlyMap<string, number>;
}

/** What of a part its parameters are read from. */
interface Sources {
  readonly part: Place;
  readonly params: Place | null;
  readonly tolerances: Place | null;
  readonly fit: Place | null;
}

/** Reads all parameters of a part of this kind; null where one is missing or bad. */
export function readParameters(kind: Kind, sources: Sources): ReadParameters | null {
  const described = Object.entries<Parameter>(catalogue[kind].parameters);
  const given = readGiven(kind, described, sources);
  const fitted = sources.fit === null ? null : readFit(sources.fit);
  const stated = readStated(described, given, sources);

  const values = new Map<string, ParameterValue>();
  for (const [name, parameter] of described) {
    const value = given.get(name)?.read?.value ?? fitted?.get(name) ?? defaultOf(parameter);
    if (value !== undefined) values.set(name, value);
    else if (!given.has(name)) {
      const message = `The kind "${kind}" needs the parameter "${name}"; add it.`;
      (sources.params ?? sources.part).fault("missingKey", message);
    }
    if (fitted?.has(name) && given.has(name)) {
      const message = `"${name}" follows from the datasheet points; leave one of them out.`;
      given.get(name)?.place.fault("badValue", message);
    }
  }
  if (values.size < described.length) return null;
  const contradiction = catalogue[kind].contradiction?.(values) ?? null;
  if (contradiction !== null) {
    const place = given.get(contradiction.parameter)?.place ?? sources.part;
    return place.fault("outOfRange", contradiction.message);
  }
  return { values, statedTolerances: stated };
}

type Given = ReadonlyMap<string, { readonly place: Place; readonly read: GivenParameter | null }>;

function readGiven(
  kind: Kind,
  described: readonly (readonly [string, Parameter])[],
  { params }: Sources,
): Given {
  const known = new Map(described);
  const entries = (params?.entries() ?? []).flatMap(([name, place]) => {
    const parameter = known.get(name);
    if (parameter !== undefined)
      return [[name, { place, read: readParameter(parameter, place) }] as const];
    const hint = meaning(name, known.keys());
    const message = `The kind "${kind}" has no parameter ${quoted(name)}${hint}`;
    place.fault("unknownKey", message);
    return [];
  });
  return new Map(entries);
}

function defaultOf(parameter: Parameter): ParameterValue | undefined {
  return parameter.form === "choice" ? undefined : parameter.default;
}

/** Half-widths from `params.tolerance`, from `tolerances` and from letter codes, which must agree. */
function readStated(
  described: readonly (readonly [string, Parameter])[],
  given: Given,
  sources: Sources,
): ReadonlyMap<string, number> {
  const first = firstOfTolerance(described);
  const own = given.get("tolerance")?.read?.value;
  const stated = readTolerances(described, first, sources.tolerances);
  if (first !== null && typeof own === "number") stated.set(first, own);

  const letters: [string, number][] = [];
  for (const [name, { place, read }] of given) {
    const letter = read?.tolerance ?? null;
    const other = stated.get(name);
    if (letter !== null && other !== undefined && !agree(letter, other)) {
      place.fault("badValue", "The tolerance letter contradicts the tolerance given beside it.");
    } else if (letter !== null && other === undefined) {
      letters.push([name, letter]);
    }
  }
  noteLetters(letters, first, sources);
  return new Map([...stated, ...letters]);
}

function readTolerances(
  described: readonly (readonly [string, Parameter])[],
  first: string | null,
  tolerances: Place | null,
): Map<string, number> {
  const servable = described.flatMap(([name, parameter]) =>
    parameter.form === "quantity" && name !== first && name !== "tolerance" ? [name] : [],
  );
  const read = new Map<string, number>();
  for (const [name, place] of tolerances?.entries() ?? []) {
    if (servable.includes(name)) {
      const value = place.quantity("fraction", halfWidth);
      if (value !== null) read.set(name, value);
    } else {
      const end = name === first ? '; its tolerance is "tolerance" in "params".' : ".";
      place.fault("noSuchParam", `No tolerance of ${quoted(name)} can stand here${end}`);
    }
  }
  return read;
}

/** Notes the tolerances of letter codes where they would stand if written out. */
function noteLetters(
  letters: readonly (readonly [string, number])[],
  first: string | null,
  { part, params, tolerances }: Sources,
): void {
  const others = letters.filter(([name]) => name !== first);
  for (const [name, letter] of letters) {
    if (name === first && params !== null) part.reading.add(params.pointer, "tolerance", letter);
    else if (tolerances !== null) part.reading.add(tolerances.pointer, name, letter);
  }
  if (tolerances === null && others.length > 0) {
    part.reading.add(part.pointer, "tolerances", Object.fromEntries(others));
  }
}

/** Two half-widths that mean the same: one may be a fraction computed from picofarads. */
export function agree(left: number, right: number): boolean {
  return Math.abs(left - right) <= 1e-9 * Math.max(left, right);
}

/** The parameter that `tolerance` serves: the first, of a kind that has `tolerance`. */
export function firstOfTolerance(
  described: readonly (readonly [string, Parameter])[],
): string | null {
  const [first] = described;
  return first !== undefined && described.some(([name]) => name === "tolerance") ? first[0] : null;
}
