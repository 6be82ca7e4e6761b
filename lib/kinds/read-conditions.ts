import type { Addresses } from "../circuit/addresses";
import { readHeading } from "../circuit/names";
import { isRecord, type Place } from "../circuit/place";
import { readAnalysis } from "../circuit/read-analysis";
import { readSpread } from "../circuit/read-spread";
import { celsius } from "../values/range";
import type { Block, Blocks } from "./block";
import type { Condition } from "./circuit";
import { type Override, readSet } from "./override";

const KEYS = ["name", "ambient", "set", "analysis", "start", "spread", "selfHeating"];
const ROOM_TEMPERATURE = 25;
const MOST_CONDITIONS = 1000;

/** A condition before its overrides are applied. */
export interface ReadCondition {
  readonly condition: Omit<Condition, "parts">;
  readonly overrides: readonly Override[];
}

/** The condition of a file that gives none. */
const nominal: ReadCondition = {
  condition: {
    name: "Nominal",
    ambient: ROOM_TEMPERATURE,
    selfHeating: false,
    analysis: { type: "operatingPoint" },
    start: {},
    spread: null,
    set: {},
  },
  overrides: [],
};

/** Reads the operating conditions; one named Nominal where the file has none. */
export function readConditions(
  place: Place | null,
  addresses: Addresses,
  blocks: Blocks,
  top: Block | null,
): readonly ReadCondition[] {
  const items = place?.items() ?? [];
  if (place === null || items.length === 0) return [nominal];
  if (items.length > MOST_CONDITIONS) {
    place.fault("tooLarge", `There are more than ${MOST_CONDITIONS} conditions.`);
    return [nominal];
  }
  const names = new Set<string>();
  return items.flatMap((item) => {
    const read = readCondition(item, addresses, blocks, top);
    if (read === null) return [];
    const { name } = read.condition;
    if (names.has(name)) {
      const message = `Another condition bears the name "${name}"; give this one its own.`;
      item.member("name").fault("duplicateName", message);
    }
    names.add(name);
    return [read];
  });
}

function readCondition(
  place: Place,
  addresses: Addresses,
  blocks: Blocks,
  top: Block | null,
): ReadCondition | null {
  const fields = place.fields(KEYS);
  if (fields === null) return null;
  const named = fields.required("name");
  const name = named === null ? null : readHeading(named);
  const ambient = fields.optional("ambient");
  const set = fields.optional("set");
  const analysis = fields.optional("analysis");
  const spread = fields.optional("spread");
  const condition = {
    ambient: ambient === null ? ROOM_TEMPERATURE : ambient.quantity("temperature", celsius),
    selfHeating: fields.optional("selfHeating")?.flag() ?? false,
    analysis: analysis === null ? nominal.condition.analysis : readAnalysis(analysis, addresses),
    start: readStart(fields.optional("start"), addresses),
    spread: spread === null ? null : readSpread(spread),
    set: isRecord(set?.value) ? set.value : {},
  };
  const overrides = top === null ? [] : readSet(set, blocks, top);
  if (name === null) return null;
  return {
    condition: {
      ...condition,
      name,
      ambient: condition.ambient ?? ROOM_TEMPERATURE,
      analysis: condition.analysis ?? nominal.condition.analysis,
    },
    overrides,
  };
}

function readStart(place: Place | null, addresses: Addresses): Readonly<Record<string, number>> {
  const nets = place?.fields(["nets"])?.required("nets")?.entries() ?? [];
  const start = nets.flatMap(([net, value]) => {
    if (!addresses.net(value, net)) return [];
    const voltage = value.quantity("voltage");
    return voltage === null ? [] : [[net, voltage] as const];
  });
  return Object.fromEntries(start);
}
