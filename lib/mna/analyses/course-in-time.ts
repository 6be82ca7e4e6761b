import type { Analysis } from "../../circuit/analysis";
import type { Circuit, Condition } from "../../kinds/circuit";
import { diagnose, type Fault } from "../diagnosis";
import { networkOf } from "../network";
import { type Kept, type OperatingPoint, operatingPoint, unsolved } from "../operating-point";
import type { TransientResult } from "../solution";
import { System, unbent } from "../system";
import { transient } from "./transient";

type Transient = Extract<Analysis, { type: "transient" }>;

/** S: what holds a private net while time goes on. */
const HOLDING = 1e-12;

/** The state at t = 0 as an operating point, and the course from there. */
export interface CourseInTime {
  readonly point: OperatingPoint;
  readonly transient: TransientResult | null;
  readonly faults: readonly Fault[];
}

/** A transient condition: from the operating point with waveforms at t = 0, or from rest. */
export function courseInTime(
  circuit: Circuit,
  condition: Condition,
  analysis: Transient,
  before: Kept | null,
): CourseInTime {
  const point = analysis.fromRest ? null : operatingPoint(circuit, condition, 0, before);
  if (point !== null && point.kept === null)
    return { point, transient: null, faults: point.faults };
  const system = systemFor(circuit, condition, point);
  const course = transient(system, condition, analysis, point?.kept?.x ?? null);
  if (!course.ok) {
    const known = point ?? unsolved(system.network);
    return { point: known, transient: null, faults: [course.fault] };
  }
  if (point !== null && Object.keys(analysis.initial).length === 0)
    return { point, transient: course.transient, faults: [] };
  return { point: course.start, transient: course.transient, faults: [] };
}

/** The system that moves: with the operating point's own laws, for they remember their state. */
function systemFor(circuit: Circuit, condition: Condition, point: OperatingPoint | null): System {
  const kept = point?.kept ?? null;
  if (kept !== null) {
    const system = new System(kept.system.network, kept.system.bent, kept.system.structure);
    system.stage.helping = kept.system.stage.helping;
    system.holding = HOLDING;
    return system;
  }
  const network = networkOf(circuit, condition);
  const { stage } = new System(network, unbent, null);
  const { held } = diagnose(network, stage).bent;
  const system = new System(network, { held, opened: new Set() }, null);
  system.holding = HOLDING;
  return system;
}
