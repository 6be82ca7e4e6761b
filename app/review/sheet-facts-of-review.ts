import { limitMargin } from "../../lib/review/limit-words";
import type { Finding } from "../../lib/review/review-state";
import type { ReviewView } from "../../lib/review/views";
import type { FindingMark, NetReading, PartReading, SheetFacts } from "../../lib/sheet/sheet-facts";
import { formatFixed } from "../../lib/values/format-quantity";
import { shiftWords, voltageWords } from "../wording/numbers";
import type { NetRow } from "./net-rows";
import type { StressLine } from "./stress-lines";

/** What is pencilled on the sheet of a review: was and is at the nodes, clouds, balloons, hatches. */
export function sheetFactsOfReview(
  view: ReviewView,
  condition: string,
  rows: readonly NetRow[],
  lines: readonly StressLine[],
  findings: readonly Finding[],
  checkedParts: readonly string[],
): SheetFacts {
  const edits = view.comparison?.edits ?? [];
  return {
    base: view.baseFile,
    revision: view.proposed.letter,
    edited: edits
      .filter((edit) => edit.part !== undefined && edit.change !== "moved" && view.base !== null)
      .flatMap((edit) => (edit.part === undefined ? [] : [edit.part])),
    netReadings: rows.map(netReading),
    partReadings: lines.flatMap((line) => partReading(line, condition)),
    findings: findings.flatMap(findingMark),
    checked: checkedParts,
    titleBlock: "full",
    revisionRows: Math.min(view.design.revisions.length, 4),
  };
}

function netReading(row: NetRow): NetReading {
  const moved = row.loud && row.shift !== null && row.shift !== 0;
  return {
    net: row.net,
    level: row.past ? "past" : moved ? "moved" : "quiet",
    is: `${voltageWords(row.is)} V`,
    ...(moved && row.was !== null && { was: voltageWords(row.was), shift: shiftWords(row.shift) }),
  };
}

/** Only what is past its limit in the condition at hand stands at the part itself. */
function partReading(line: StressLine, condition: string): readonly PartReading[] {
  const { row } = line;
  if (row.verdict !== "fail" || row.condition !== condition || line.waiver !== null) return [];
  if (row.quantity !== "junctionTemperature" || row.applied === null) return [];
  const was =
    line.wasRatio === null || row.limit === null ? null : (line.wasRatio * row.limit).toFixed(1);
  return [
    {
      part: row.part,
      caption: `${row.part} junct.`,
      level: "past",
      is: formatFixed(row.applied, "°C", 1),
      ...(was !== null && { was }),
    },
  ];
}

function findingMark(finding: Finding): readonly FindingMark[] {
  const { anchor } = finding;
  if (!("net" in anchor || "part" in anchor)) return [];
  return [{ id: finding.id, number: finding.number, severity: finding.severity, anchor }];
}

/** The limits that fail and no waiver covers: counted on the Limits tab. */
export function limitsPast(view: ReviewView): number {
  return (view.result?.limits ?? []).filter((row) => (limitMargin(row) ?? -1) < 0).length;
}
