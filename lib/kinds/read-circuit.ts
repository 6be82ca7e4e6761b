import { digest, electricalDigest } from "../circuit/digest";
import { parseJson } from "../circuit/json-text";
import { readName } from "../circuit/names";
import { type Fields, Place } from "../circuit/place";
import { problemsOfJson } from "../circuit/plain-json";
import { readPolicy } from "../circuit/policy";
import { readLimits } from "../circuit/read-limits";
import { Reading } from "../circuit/reading";
import { meaning } from "../values/nearest-word";
import type { FileProblem } from "../values/problem";
import { quoted } from "../values/read-value";
import { fail, ok, type Result } from "../values/result";
import { assemblePart } from "./assemble-part";
import type { Block, Blocks } from "./block";
import { kinds } from "./catalogue";
import { checkContainment } from "./check-containment";
import type { Circuit, Condition } from "./circuit";
import { circuitAddresses } from "./circuit-addresses";
import { addOverrides, type FlatPart, flatten, readSets } from "./flatten";
import { knownNets } from "./known-nets";
import type { ParameterValue } from "./parameter";
import type { Part } from "./part";
import { readBlocks } from "./read-blocks";
import { type ReadCondition, readConditions } from "./read-conditions";
import { inCodePointOrder, referenceNet } from "./reference-net";

const KEYS = ["ampersign", "title", "reference", "top", "blocks", "conditions", "limits", "policy"];
const DEFAULT_REFERENCE = "GND";

/** Reads the text of a circuit file: the circuit, or every problem that can be found in it. */
export function readCircuit(text: string): Result<Circuit, readonly FileProblem[]> {
  const parsed = parseJson(text);
  if (!parsed.ok) return fail([parsed.error]);
  const { value, duplicates } = parsed.value;
  const read = readCircuitFile(value);
  return duplicates.length === 0 ? read : fail([...duplicates, ...(read.ok ? [] : read.error)]);
}

/** The same for a file that is parsed already. */
export function readCircuitFile(value: unknown): Result<Circuit, readonly FileProblem[]> {
  const unfit = problemsOfJson(value);
  if (unfit.some((problem) => problem.code === "tooLarge")) return fail(unfit);
  const reading = new Reading();
  const file = new Place(value, "", reading);
  const circuit = readFile(file);
  const found = reading.problems;
  const places = new Set(found.map((problem) => problem.at));
  const problems = [...found, ...unfit.filter((problem) => !places.has(problem.at))];
  if (circuit === null || problems.length > 0) return fail(problems);
  return ok({
    ...circuit,
    digest: digest(value),
    electricalDigest: electricalDigest(value, reading),
  });
}

type Undigested = Omit<Circuit, "digest" | "electricalDigest">;

function readFile(file: Place): Undigested | null {
  const fields = file.fields(KEYS);
  if (fields === null) return null;
  checkVersion(fields.required("ampersign"));
  const title = fields.optional("title")?.text() ?? "";
  const named = fields.optional("reference");
  const reference = (named === null ? null : readName(named)) ?? DEFAULT_REFERENCE;
  const placed = fields.required("blocks");
  const blocks: Blocks = placed === null ? new Map() : readBlocks(placed, reference);
  const top = findTop(fields, placed, blocks);
  const sets = readSets(blocks);
  const flat = checkContainment(blocks, top) ? flatten(blocks, top, reference, sets) : null;

  const fitted = (flat?.parts ?? []).filter((part) => part.fitted);
  const held = referenceNet(reference, fitted);
  const nets = knownNets(blocks, flat, held);
  const addresses = circuitAddresses(blocks, top, nets);
  const conditions = readConditions(fields.optional("conditions"), addresses, blocks, top);
  const names = new Set(conditions.map(({ condition }) => condition.name));
  const limits = fields.optional("limits");
  const circuit = {
    title,
    reference: held,
    nets: inCodePointOrder([...nets.fitted]),
    limits: limits === null ? [] : readLimits(limits, addresses, names),
    policy: readPolicy(fields.optional("policy"), kinds),
  };
  // Parts are put together only where everything was read: what is missing has no value to give.
  if (flat === null || file.reading.problems.length > 0) return null;
  const parts = fitted.map((part) => assemblePart(part, new Map()));
  return {
    ...circuit,
    parts,
    conditions: conditions.map((read) => applied(read, fitted, parts)),
  };
}

function checkVersion(place: Place | null): void {
  if (place === null || place.value === 1) return;
  place.fault("badValue", 'This reader knows version 1 of the file; write "ampersign": 1.');
}

function findTop(fields: Fields, placed: Place | null, blocks: Blocks): Block | null {
  const place = fields.optional("top");
  const [only, another] = blocks.values();
  if (place === null) {
    if (another !== undefined) {
      fields.place.fault("missingKey", 'The file has several blocks; name the top one with "top".');
      return null;
    }
    if (only === undefined && placed !== null) {
      placed.fault("badValue", "There is no block; a circuit needs one.");
    }
    return only ?? null;
  }
  const name = place.text();
  const top = name === null ? undefined : blocks.get(name);
  if (name !== null && top === undefined) {
    const hint = meaning(name, blocks.keys());
    place.fault("noSuchBlock", `There is no block ${quoted(name)}${hint}`);
  }
  return top ?? null;
}

/** The condition with the parts as it sets them; parts that it leaves alone are shared. */
function applied(
  { condition, overrides }: ReadCondition,
  flat: readonly FlatPart[],
  parts: readonly Part[],
): Condition {
  if (overrides.length === 0) return { ...condition, parts };
  const byPath = new Map<string, Map<string, ParameterValue>>();
  addOverrides(byPath, "", overrides);
  return {
    ...condition,
    parts: parts.map((part, index) => {
      const own = byPath.get(part.path);
      const source = flat[index];
      return own === undefined || source === undefined ? part : assemblePart(source, own);
    }),
  };
}
