import { ok, type Result } from "../values/result";
import { type Converged, type NewtonOptions, type NoSolution, newton, plainNewton } from "./newton";
import type { System } from "./system";

/** How a solution was found: the name stands in the certificate. */
export interface Found extends Converged {
  readonly method: string;
}

type Way = (system: System, x: Float64Array) => Result<Converged, NoSolution>;

/** S, across junctions, while a solution is approached. */
const HELPING = 1e-12;
const FIRST_SHUNT = 1e-2;
const LAST_SHUNT = 1e-13;

const damped: NewtonOptions = { ...plainNewton, mostIterations: 200, largestStep: 0.5 };

/** In this order: the later ones are slower and surer. */
const ways: readonly { readonly method: string; readonly way: Way }[] = [
  { method: "newton", way: (system, x) => newton(system, x, plainNewton) },
  { method: "dampedNewton", way: (system, x) => newton(system, x, damped) },
  { method: "gainStepping", way: gainStepping },
  { method: "conductanceStepping", way: conductanceStepping },
  { method: "sourceStepping", way: sourceStepping },
  { method: "pseudoTransient", way: pseudoTransient },
];

/**
 * Solves from a warm start (`x` as given) or a cold one, by continuation where Newton's steps alone do
 * not settle. The helping conductance is out of the solution unless nothing else holds a net.
 */
export function findSolution(
  system: System,
  x: Float64Array,
  warm: boolean,
): Result<Found, NoSolution> {
  system.stage.helping = HELPING;
  if (warm) {
    system.stage.begin = "warm";
    const answer = newton(system, x, plainNewton);
    if (answer.ok) return ok(finished(system, x, answer.value, "newton"));
  }
  let answer: Result<Converged, NoSolution> | null = null;
  for (const { method, way } of ways) {
    x.fill(0);
    system.stage.helping = HELPING;
    system.stage.begin = "cold";
    answer = way(system, x);
    restore(system);
    if (answer.ok) return ok(finished(system, x, answer.value, method));
    if (answer.error.kind === "singular" && isLinear(system)) break;
  }
  if (answer === null) throw new Error("there is always a first way");
  return answer;
}

function finished(system: System, x: Float64Array, by: Converged, method: string): Found {
  if (isLinear(system)) {
    system.stage.helping = 0;
    return { iterations: 1, factor: by.factor, method: "direct" };
  }
  const last = withoutHelp(system, x);
  return last === null
    ? { ...by, method }
    : { ...last, iterations: by.iterations + last.iterations, method };
}

function isLinear(system: System): boolean {
  return system.network.parts.every(({ law }) => law.linear);
}

/** The last steps without the helping conductance; null where the equations need it. */
function withoutHelp(system: System, x: Float64Array): Converged | null {
  const before = x.slice();
  system.stage.helping = 0;
  system.stage.begin = "warm";
  const answer = newton(system, x, plainNewton);
  if (answer.ok) return answer.value;
  x.set(before);
  system.stage.helping = HELPING;
  system.stage.begin = "warm";
  system.assemble(x);
  return null;
}

function restore(system: System): void {
  system.shunt = 0;
  system.anchor.fill(0);
  system.stage.sources = 1;
  system.stage.gainCap = Number.POSITIVE_INFINITY;
}

/** The amplifiers' gain from 10 up by decades. */
function gainStepping(system: System, x: Float64Array): Result<Converged, NoSolution> {
  return follow(system, x, 1, (at) => {
    system.stage.gainCap = at >= 9 ? Number.POSITIVE_INFINITY : 10 ** at;
    return at >= 9;
  });
}

/** Shunts from every node to the reference, from 10 mS down to none. */
function conductanceStepping(system: System, x: Float64Array): Result<Converged, NoSolution> {
  return follow(system, x, 1, (at) => {
    const shunt = FIRST_SHUNT * 10 ** (1 - at);
    system.shunt = shunt < LAST_SHUNT ? 0 : shunt;
    return system.shunt === 0;
  });
}

/** The sources from nothing to their value, with the amplifiers' gain held low until they are up. */
function sourceStepping(system: System, x: Float64Array): Result<Converged, NoSolution> {
  const up = follow(system, x, 1, (at) => {
    system.stage.gainCap = 10;
    system.stage.sources = Math.min(1, at / 10);
    return at >= 10;
  });
  return up.ok ? gainStepping(system, x) : up;
}

/** Pseudo-transient continuation (Kelley and Keyes 1998): shunts to where the search stands, growing weaker. */
function pseudoTransient(system: System, x: Float64Array): Result<Converged, NoSolution> {
  let shunt = 1;
  let answer: Result<Converged, NoSolution> = newton(system, x, {
    ...plainNewton,
    mostIterations: 1,
  });
  for (let step = 0; step < 300 && shunt > LAST_SHUNT; step++) {
    system.shunt = shunt;
    system.anchor.set(x);
    system.stage.begin = "warm";
    answer = newton(system, x, { ...plainNewton, mostIterations: 20 });
    if (!answer.ok) {
      x.set(system.anchor);
      shunt *= 4;
      if (shunt > 1e6) return answer;
    } else {
      shunt /= answer.value.iterations < 8 ? 3 : 1.5;
    }
  }
  system.shunt = 0;
  system.stage.begin = "warm";
  return newton(system, x, plainNewton);
}

/**
 * Follows a path of problems from `first` on in steps of 1, halved where a step fails.
 * @param set makes the problem at a place of the path; true: it is the one to be solved
 */
function follow(
  system: System,
  x: Float64Array,
  first: number,
  set: (at: number) => boolean,
): Result<Converged, NoSolution> {
  let reached = first - 1;
  let width = 1;
  let iterations = 0;
  let good = x.slice();
  for (let attempt = 0; attempt < 120; attempt++) {
    const at = reached + width;
    const last = set(at);
    if (attempt > 0) system.stage.begin = reached < first ? "cold" : "warm";
    const answer = newton(system, x, plainNewton);
    if (answer.ok) {
      iterations += answer.value.iterations;
      if (last) return { ok: true, value: { ...answer.value, iterations } };
      good = x.slice();
      reached = at;
      width = Math.min(1, width * 2);
    } else {
      x.set(good);
      width /= 2;
      if (width < 1 / 64) return answer;
    }
  }
  return { ok: false, error: { kind: "noConvergence", iterations, unknown: 1 } };
}
