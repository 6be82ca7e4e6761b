import { catalogue } from "./catalogue";
import type { FlatPart, Overrides } from "./flatten";
import { holds, type Parameter, type ParameterValue } from "./parameter";
import type { Kind, Part, PartBody, Parts } from "./part";
import { firstOfTolerance } from "./read-parameters";

/** The part as everything downstream knows it: its own values, then its block's, then the condition's. */
export function assemblePart(flat: FlatPart, ofCondition: Overrides): Part {
  const { source } = flat;
  const overrides = new Map([...flat.overrides, ...ofCondition]);
  const described = Object.entries<Parameter>(catalogue[source.kind].parameters);
  const first = firstOfTolerance(described);
  const tolerances = new Map(source.statedTolerances);
  for (const [name] of described) {
    const letter = overrides.get(`tolerances.${name}`);
    if (typeof letter === "number") tolerances.set(name, letter);
  }

  const params: Record<string, ParameterValue> = {};
  for (const [name] of described) {
    const own = source.parameters.get(name) ?? null;
    const set = overrides.get(name);
    params[name] = set === undefined ? own : set;
  }
  if (first !== null) {
    const set = overrides.get("tolerance");
    if (set === undefined) params["tolerance"] = tolerances.get(first) ?? 0;
    tolerances.delete(first);
  }
  const temperature = overrides.get("temperature");

  const body: PartBody = {
    path: flat.path,
    pins: Object.fromEntries(flat.pins),
    control: flat.control,
    of: flat.of,
    ratings: Object.fromEntries(source.ratings),
    junctionToAmbient: source.junctionToAmbient,
    style: source.style,
    tolerances: Object.fromEntries(tolerances),
    drift: source.drift,
    temperature:
      typeof temperature === "number" || temperature === null ? temperature : source.temperature,
    id: source.id,
    note: source.note,
    at: source.at,
    pointer: source.place.pointer,
  };
  return joinPart(source.kind, body, params);
}

/** Joins a part's body and parameters under its kind. */
export function joinPart<K extends Kind>(kind: K, body: PartBody, params: object): Part<K> {
  if (!areParameters(kind, params))
    throw new Error(`the parameters of ${body.path} are incomplete`);
  return { ...body, kind, params };
}

/** Whether the object has every parameter of the kind, each with a value that it may hold. */
function areParameters<K extends Kind>(kind: K, params: object): params is Parts[K] {
  const values = new Map<string, unknown>(Object.entries(params));
  return Object.entries<Parameter>(catalogue[kind].parameters).every(([name, parameter]) =>
    holds(parameter, values.get(name)),
  );
}
