import type { CriterionId } from "../../lib/review/exit-criterion";

/** The exit criteria as the title block words them. */
export const criterionWords: Readonly<Record<CriterionId, string>> = {
  solved: "Every condition solved, certified",
  limits: "Limits met or waived",
  stress: "Stress margins met or waived",
  ratings: "Ratings complete for the rules",
  findings: "Major findings closed",
  checked: "Changed items checked",
  newest: "No newer revision under review",
};
