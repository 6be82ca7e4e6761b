import type { Analysis } from "../../circuit/analysis";
import type { Condition } from "../../kinds/circuit";
import { certify } from "../certificate";
import type { Fault } from "../diagnosis";
import type { OperatingPoint } from "../operating-point";
import { readSolution } from "../part-results";
import { isRestless, settled } from "../settle";
import type { TransientResult } from "../solution";
import type { System } from "../system";
import { cornersOf } from "./corners";
import { INSTANT, initialState, reinitialise } from "./initial-state";
import { Recorder } from "./recorder";
import { emptyState, type State, step } from "./tr-bdf2";
import { Watch } from "./watch";

type Transient = Extract<Analysis, { type: "transient" }>;

/** A course in time, or what stopped it; `start` is the state at t = 0. */
export type Course =
  | { readonly ok: true; readonly transient: TransientResult; readonly start: OperatingPoint }
  | { readonly ok: false; readonly fault: Fault };

/** Error allowed in a step, of the greatest size an unknown had so far. */
const RELATIVE = 3e-5;
/** The same, V or A, below which nothing is measured. */
const ABSOLUTE = 1e-6;
const SAFETY = 0.85;
const MOST_GROWTH = 3;
const LEAST_SHRINKING = 0.2;
/** Of the whole course: a smaller step is none. */
const LEAST_STEP = 1e-13;
/** Numbers that one course may store. */
const MOST_STORED = 5_000_000;
const MOST_STEPS = 500_000;
/** Of the whole course: how exactly switching is located. */
const RESOLUTION = 1e-9;
/** A comparator that switches more often is none, but an amplifier in the linear part of its range. */
const MOST_FLIPS = 20_000;
/** Parts that switch each other at one time. */
const MOST_ROUNDS = 10;

/**
 * Follows the circuit in time by TR-BDF2 with steps as large as the error allows, exactly onto every
 * corner of a waveform; there, and where a comparator changes state, it begins anew.
 * @param system at rest or at the operating point; its stage is used
 */
export function transient(
  system: System,
  condition: Condition,
  analysis: Transient,
  operatingPoint: Float64Array | null,
): Course {
  const run = new Run(system, condition, analysis, operatingPoint);
  const start = run.begin();
  if (start === null) return { ok: false, fault: run.stopped("noConvergence") };
  const fault = run.follow();
  return fault === null ? { ok: true, transient: run.result(), start } : { ok: false, fault };
}

class Run {
  private readonly recorder: Recorder;
  private readonly recorded: readonly string[];
  private readonly watch = new Watch();
  private readonly corners: readonly number[];
  private readonly carries: Uint8Array;
  private readonly largest: Float64Array;
  private readonly instant: number;
  private flips = 0;
  private state: State;
  private middle: State;
  private end: State;

  constructor(
    private readonly system: System,
    condition: Condition,
    private readonly analysis: Transient,
    operatingPoint: Float64Array | null,
  ) {
    const { unknowns } = system.network;
    const all = unknowns.names.flatMap((name) => ("net" in name ? [name.net] : []));
    this.recorded = analysis.record ?? all;
    this.recorder = new Recorder(this.recorded.map((net) => unknowns.ofNet(net)));
    this.corners = cornersOf(condition.parts, analysis.until);
    this.carries = new Uint8Array(system.size + 1);
    this.largest = new Float64Array(system.size + 1);
    this.instant = INSTANT * analysis.until;
    this.state = initialState(system, analysis, operatingPoint);
    system.stage.switching = true;
    settled(system, this.state.x);
    this.middle = emptyState(system);
    this.end = emptyState(system);
  }

  /** The state at t = 0, proved with its charging currents; null where there is none. */
  begin(): OperatingPoint | null {
    if (!reinitialise(this.system, this.state, this.instant)) return null;
    for (const { law } of this.system.network.parts)
      law.c.forEach((c, k) => {
        if (c !== 0) this.carries[law.columns[k] ?? 0] = 1;
      });
    this.note();
    this.recorder.add(0, this.state.x);
    const { system, state } = this;
    const { factor } = system.structure;
    const found = factor === null ? null : { iterations: 1, factor, method: "newton" };
    const certificate = found === null ? null : certify(system, state.x, found, state.charging);
    const reading = readSolution(system, state.x, state.charging);
    return { ...reading, certificate, faults: [], kept: null };
  }

  /** Steps to the end; what stopped it, or null. */
  follow(): Fault | null {
    const { until, maxStep } = this.analysis;
    let width = Math.min(maxStep, until) / 1000;
    let corner = 0;
    for (let steps = 0; this.state.time < until; steps++) {
      if (this.flips > MOST_FLIPS) return this.stopped("stepTooSmall");
      if (steps > MOST_STEPS || this.recorder.stored > MOST_STORED) return this.stopped("tooLarge");
      while ((this.corners[corner] ?? until) <= this.state.time && corner < this.corners.length)
        corner++;
      const target = this.corners[corner] ?? until;
      const onto = corner < this.corners.length;
      const lands = this.landing(Math.min(width, maxStep), target);
      const error = this.try(lands.width, lands.lands ? target : null, onto);
      // Switching is located by halving; where it happens, to the resolution, the step ends.
      if (error <= 1 && lands.width > RESOLUTION * until && isRestless(this.system, this.end.x)) {
        width = lands.width / 2;
        continue;
      }
      if (error <= 1) {
        if (!this.accept(lands.lands, target, onto)) return this.stopped("noConvergence");
        const growth = error === 0 ? MOST_GROWTH : SAFETY * error ** (-1 / 3);
        const next = lands.width * Math.min(MOST_GROWTH, Math.max(LEAST_SHRINKING, growth));
        width =
          lands.lands && onto
            ? Math.min(next, maxStep / 100)
            : Math.max(next, lands.lands ? width : 0);
        continue;
      }
      width = lands.width * Math.max(LEAST_SHRINKING, SAFETY * error ** (-1 / 3));
      if (width < LEAST_STEP * until && !this.jump()) return this.stopped("stepTooSmall");
      width = Math.max(width, 10 * LEAST_STEP * until);
    }
    return null;
  }

  result(): TransientResult {
    const { time, values } = this.recorder;
    const nets = this.recorded.map((net, n) => [net, values[n] ?? []] as const);
    return { time, nets: Object.fromEntries(nets), ...this.watch.result() };
  }

  stopped(code: "noConvergence" | "stepTooSmall" | "tooLarge"): Fault {
    const { names } = this.system.network.unknowns;
    let worst = 0;
    let most = 0;
    names.forEach((name, unknown) => {
      const moved = Math.abs((this.end.x[unknown] ?? 0) - (this.state.x[unknown] ?? 0));
      if ("net" in name && moved > most) [worst, most] = [unknown, moved];
    });
    const name = names[worst];
    const nets = worst > 0 && name !== undefined && "net" in name ? [name.net] : [];
    const parts = this.system.network.parts
      .filter(({ law }) => worst > 0 && law.terminals.includes(worst))
      .map(({ part }) => part.path);
    return { code, nets, parts };
  }

  /** The width of the next step: onto the target, or half the way where the rest would be a sliver. */
  private landing(width: number, target: number): { width: number; lands: boolean } {
    const rest = target - this.state.time;
    if (width >= rest * (1 - 1e-9)) return { width: rest, lands: true };
    return { width: Math.min(width, rest / 2), lands: false };
  }

  private try(width: number, target: number | null, onto: boolean): number {
    const endTime = target === null ? this.state.time + width : onto ? justBefore(target) : target;
    return step(this.system, this.state, this.middle, this.end, width, endTime, (unknown) =>
      this.carries[unknown] === 1
        ? ABSOLUTE +
          RELATIVE * Math.max(this.largest[unknown] ?? 0, Math.abs(this.state.x[unknown] ?? 0))
        : 0,
    );
  }

  private accept(lands: boolean, target: number, onto: boolean): boolean {
    if (lands) this.end.time = target;
    const cornered = lands && onto;
    const endTime = cornered ? justBefore(target) : this.end.time;
    this.recorder.addStep(this.state, this.middle, this.end, endTime);
    [this.state, this.end] = [this.end, this.state];
    this.note(endTime);
    return cornered || isRestless(this.system, this.state.x) ? this.anew() : true;
  }

  /** Begins anew after a jump: at the same time, with the same charges. */
  private anew(): boolean {
    for (let round = 0; round < MOST_ROUNDS; round++) {
      const flipped = settled(this.system, this.state.x);
      if (round > 0 && !flipped) break;
      if (flipped) this.flips++;
      if (!reinitialise(this.system, this.state, this.instant)) return false;
    }
    this.note();
    const last = this.recorder.time.at(-1) ?? 0;
    if (this.state.time > last) this.recorder.add(this.state.time, this.state.x);
    return true;
  }

  /** Where the circuit has no state near this one, it jumps to another with the same charges. */
  private jump(): boolean {
    const before = this.state.x.slice();
    if (!this.anew()) return false;
    return before.some(
      (value, k) => Math.abs(value - (this.state.x[k] ?? 0)) > 1e-6 * (1 + Math.abs(value)),
    );
  }

  private note(time = this.state.time): void {
    const { x } = this.state;
    for (let k = 0; k < x.length; k++)
      this.largest[k] = Math.max(this.largest[k] ?? 0, Math.abs(x[k] ?? 0));
    this.watch.add(this.system, x, time, this.state.charging);
  }
}

/** The double before a positive time. */
function justBefore(time: number): number {
  return time * (1 - 2 ** -52);
}
