/** A thread of the worker: computes one run, telling how far it is. Its entry is the default export (piscina). */
import type { MessagePort } from "node:worker_threads";
import { digest } from "../circuit/digest";
import { compare, compareWithNothing, type Side } from "../comparison/compare";
import { readSide } from "../comparison/read-side";
import { judge } from "../stress/judge";
import type { RunOutcome, RunProgress, RunTask } from "./run-task";

/** Unknowns grow with parts; beyond this a run would take memory from everybody else's. */
const MOST_PARTS = 20_000;

export default function compute(given: {
  readonly task: RunTask;
  readonly port: MessagePort;
}): RunOutcome {
  const { task, port } = given;
  const tell = (done: number, of: number, at: string): void => {
    const progress: RunProgress = { done, of, at: at === "" ? null : at };
    port.postMessage(progress);
  };
  const proposed = readSide(task.proposed);
  if (!proposed.ok) return failed(proposed.error[0]?.message ?? "The circuit file cannot be read.");
  if (proposed.value.circuit.parts.length > MOST_PARTS)
    return failed(`The circuit has more than ${MOST_PARTS} parts: too many for one run.`);
  if (task.kind === "solve")
    return done(judge(proposed.value.circuit, { everyCondition: true, onProgress: tell }));
  const base = task.base === null ? null : readSide(task.base);
  if (base !== null && !base.ok)
    return failed(base.error[0]?.message ?? "The base's circuit file cannot be read.");
  return done(compared(base === null ? null : base.value, proposed.value, tell));
}

function compared(
  base: Side | null,
  proposed: Side,
  tell: (done: number, of: number, at: string) => void,
) {
  return base === null ? compareWithNothing(proposed) : compare(base, proposed, tell);
}

function done(result: unknown): RunOutcome {
  return { kind: "done", result: JSON.stringify(result), resultDigest: digest(result) };
}

function failed(sentence: string): RunOutcome {
  return { kind: "failed", sentence };
}
