/** What a judgement may say. Unknown is never a pass: something that the judgement needs is missing. */
export type Verdict = "pass" | "unknown" | "fail";

/**
 * The verdict over several: one fail fails all, else one unknown leaves it unknown. Judging nothing
 * is unknown, so that an empty list never passes.
 */
export function worst(verdicts: readonly Verdict[]): Verdict {
  if (verdicts.includes("fail")) return "fail";
  if (verdicts.length === 0 || verdicts.includes("unknown")) return "unknown";
  return "pass";
}
