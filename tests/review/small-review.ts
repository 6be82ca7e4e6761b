import type { Comparison } from "../../lib/comparison/comparison";
import { exitCriteria } from "../../lib/review/exit-criteria";
import type { Decision, ReviewState } from "../../lib/review/review-state";
import { judge } from "../../lib/stress/judge";
import { sideOf } from "../demo-revisions";

const { circuit } = sideOf({
  ampersign: 1,
  blocks: {
    main: {
      parts: [
        { ref: "V1", kind: "voltageSource", pins: { plus: "A", minus: "GND" }, params: { dc: 10 } },
        ...["R1", "R2"].map((ref) => ({
          ref,
          kind: "resistor",
          pins: { "1": "A", "2": "GND" },
          params: { resistance: "1k" },
          ratings: { power: 1, voltage: 100 },
        })),
      ],
    },
  },
  conditions: [{ name: "Cool" }, { name: "Warm", ambient: 60 }],
  limits: [
    { net: "A", max: 12 },
    { net: "A", min: 9 },
  ],
});
/** Two resistors in two conditions and a limit from both sides: all met. */
export const result = judge(circuit, { everyCondition: true });

const comparison: Comparison = {
  ampersignComparison: 1,
  base: "",
  proposed: circuit.digest,
  edits: [
    { id: "R1.resistance", change: "value", part: "R1", key: "resistance", was: "2k", is: "1k" },
    { id: "R2 moved", change: "moved", part: "R2" },
    { id: "OUT renamed", change: "renamed", net: "A", was: "OUT", is: "A" },
  ],
  nets: [],
  stress: [],
  causes: [],
  problems: [],
};

let next = 0;
/** A decision of a kind by a person. */
export function decided<K extends Decision["kind"]>(
  kind: K,
  user: string,
  rest: Omit<Extract<Decision, { kind: K }>, "id" | "kind" | "user" | "at">,
) {
  next += 1;
  return { id: `d${next}`, kind, user, at: "2026-11-29T08:00:00.000Z", ...rest };
}
export const check = (user: string, item: string, revision = "D") =>
  decided("check", user, { revision, item });
export const uncheck = (user: string, item: string) =>
  decided("uncheck", user, { revision: "D", item });
export const checks = [check("idris", "R1.resistance"), check("idris", "OUT renamed")];

/** The review of it, every criterion met. */
export const state: ReviewState = {
  revision: "D",
  authors: ["mara"],
  approvers: ["tove"],
  result,
  comparison,
  findings: [],
  decisions: checks,
  newerUnderReview: [],
};
export const verdict = (given: ReviewState, id: string) =>
  exitCriteria(given).find((criterion) => criterion.id === id)?.verdict;
