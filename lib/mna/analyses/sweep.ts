import type { Analysis } from "../../circuit/analysis";
import type { Circuit, Condition } from "../../kinds/circuit";
import { withParameter } from "../../kinds/with-parameter";
import type { Fault } from "../diagnosis";
import { type Kept, type OperatingPoint, operatingPoint } from "../operating-point";
import type { SweepResult } from "../solution";
import { Watch } from "./watch";

type Sweep = Extract<Analysis, { type: "sweep" }>;

/** Operating points over the values of a source, a parameter or the ambient, each from the one before. */
export function sweep(
  circuit: Circuit,
  condition: Condition,
  analysis: Sweep,
  point: OperatingPoint,
  before: Kept | null,
): { readonly sweep: SweepResult; readonly faults: readonly Fault[]; readonly kept: Kept | null } {
  const { from, to, points } = analysis;
  const watch = new Watch();
  const values: number[] = [];
  const courses = new Map<string, (number | null)[]>(circuit.nets.map((net) => [net, []]));
  const faults: Fault[] = [...point.faults];
  let kept = point.kept ?? before;
  for (let k = 0; k < points; k++) {
    const value = k === points - 1 ? to : from + ((to - from) * k) / (points - 1);
    values.push(value);
    const one = operatingPoint(circuit, at(condition, analysis.of, value), null, kept);
    for (const [net, course] of courses) course.push(one.nets[net] ?? null);
    faults.push(...one.faults);
    if (one.kept === null) continue;
    kept = one.kept;
    watch.add(kept.system, kept.x, value, null);
  }
  return {
    sweep: { values, nets: Object.fromEntries(courses), ...watch.result() },
    faults: distinct(faults),
    kept,
  };
}

/** The condition with the swept quantity at a value. */
function at(condition: Condition, of: string, value: number): Condition {
  if (of === "ambient") return { ...condition, ambient: value };
  const dot = of.lastIndexOf(".");
  const path = of.slice(0, dot);
  const name = of.slice(dot + 1);
  const parts = condition.parts.map((part) =>
    part.path === path ? withParameter(part, name, value) : part,
  );
  return { ...condition, parts };
}

/** A fault of many points is told once. */
function distinct(faults: readonly Fault[]): readonly Fault[] {
  return [...new Map(faults.map((fault) => [JSON.stringify(fault), fault])).values()];
}
