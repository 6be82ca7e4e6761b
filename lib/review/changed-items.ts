import type { Comparison, Edit } from "../comparison/comparison";

/**
 * The edits that someone other than the author must check: all but those that only moved something on
 * the sheet. A renaming changes no voltage, but it changes what people order, measure and talk about.
 */
export function changedItems(comparison: Comparison): readonly Edit[] {
  return comparison.edits.filter((edit) => edit.change !== "moved");
}
