import type { Verdict } from "../values/verdict";

export type CriterionId =
  | "solved"
  | "limits"
  | "stress"
  | "ratings"
  | "findings"
  | "checked"
  | "newest";

/** One line of the title block: computed, never ticked by hand. */
export interface ExitCriterion {
  readonly id: CriterionId;
  readonly verdict: Verdict;
  /** How many hold, of how many. */
  readonly met: number;
  readonly of: number;
  /** What stands open, each naming its place: `Q1 junctionTemperature, Hot and charging`. */
  readonly open: readonly string[];
  /** What holds only by a waiver: `W-1`. */
  readonly waived: readonly string[];
}
