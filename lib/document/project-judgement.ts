import type * as Y from "yjs";
import type { FileCondition, FileLimit, FileParameter } from "../circuit/circuit-file";
import { membersOf, numberOf, textOf } from "./plain";
import { entriesOf, topLevel } from "./shape";
import { isAnalysis, isParameter, isSpread, isStart, isWrittenValue } from "./written";

/** The conditions in their order. Addresses name parts by id in the document, by designator in the file. */
export function projectConditions(
  doc: Y.Doc,
  designatorOf: ReadonlyMap<string, string>,
): readonly FileCondition[] {
  return ordered(topLevel(doc, "conditions")).flatMap((map): readonly FileCondition[] => {
    const name = textOf(map.get("name"));
    if (name === null || name === "") return [];
    const ambient = map.get("ambient");
    const analysis = map.get("analysis");
    const start = map.get("start");
    const spread = map.get("spread");
    const set: [string, FileParameter][] = [];
    for (const [address, value] of Object.entries(membersOf(map.get("set"))))
      if (isParameter(value)) set.push([byDesignator(address, designatorOf), value]);
    return [
      {
        name,
        ...(isWrittenValue(ambient) && { ambient }),
        ...(set.length > 0 && {
          set: Object.fromEntries(set.sort(([a], [b]) => (a < b ? -1 : 1))),
        }),
        ...(isAnalysis(analysis) && { analysis }),
        ...(isStart(start) && { start }),
        ...(isSpread(spread) && { spread }),
        ...(map.get("selfHeating") === true && { selfHeating: true }),
      },
    ];
  });
}

/** The limits in their order. */
export function projectLimits(
  doc: Y.Doc,
  designatorOf: ReadonlyMap<string, string>,
): readonly FileLimit[] {
  return ordered(topLevel(doc, "limits")).flatMap((map): readonly FileLimit[] => {
    const min = map.get("min");
    const max = map.get("max");
    const condition = textOf(map.get("condition"));
    const bounds = {
      ...(isWrittenValue(min) && { min }),
      ...(isWrittenValue(max) && { max }),
      ...(condition !== null && { condition }),
    };
    const net = textOf(map.get("net"));
    if (net !== null) return [{ net, ...bounds }];
    const between = map.get("between");
    if (Array.isArray(between)) {
      const [a, b] = [textOf(between[0]), textOf(between[1])];
      return a === null || b === null ? [] : [{ between: [a, b], ...bounds }];
    }
    const part = textOf(map.get("part"));
    const quantity = textOf(map.get("quantity"));
    if (part === null || quantity === null) return [];
    return [{ part: byDesignator(part, designatorOf), quantity, ...bounds }];
  });
}

function ordered(collection: Y.Map<unknown>): readonly Y.Map<unknown>[] {
  return entriesOf(collection)
    .map(([id, map]) => ({ id, map, order: numberOf(map.get("order")) ?? 0 }))
    .sort((a, b) => a.order - b.order || (a.id < b.id ? -1 : 1))
    .map(({ map }) => map);
}

/** `#id/R1.resistance` as `X1/R1.resistance`; an id that is gone stays, so that the file's reader names the place. */
function byDesignator(address: string, designatorOf: ReadonlyMap<string, string>): string {
  if (!address.startsWith("#")) return address;
  const end = /[/.]/.exec(address)?.index ?? address.length;
  const id = address.slice(1, end);
  return `${designatorOf.get(id) ?? id}${address.slice(end)}`;
}
