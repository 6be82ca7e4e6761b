import type { OutlineBlock, OutlineSection } from "../../lib/record/record-outline";
import type { ReviewRecord } from "../../lib/record/review-record";
import { latestChecks } from "../../lib/review/checks";
import { editWords } from "../review/edit-words";
import { worstRows } from "../review/stress-lines";
import { marginWords, shiftWords, voltageWords } from "../wording/numbers";
import { quantityName } from "../wording/quantities";

/** At most this many nearest margins are printed; the JSON record has all. */
const NEAREST = 12;

/** Section 4: what was edited and by whom checked, what moved beyond its band, and the nearest margins. */
export function changedSection(record: ReviewRecord): OutlineSection {
  return {
    number: 4,
    title: "What changed, what moved, and what is nearest its limit",
    blocks: [editsBlock(record), shiftsBlock(record), marginsBlock(record)],
  };
}

function editsBlock(record: ReviewRecord): OutlineBlock {
  const edits = record.comparison?.edits ?? [];
  if (edits.length === 0) return { kind: "text", text: "No edit against the base." };
  const checks = latestChecks(record.decisions, record.revision.letter);
  const nameOf = new Map(record.people.map((person) => [person.id, person.name]));
  return {
    kind: "table",
    head: ["Edit", "Checked by"],
    widths: [120, 62],
    rows: edits.map((edit) => {
      const check = checks.get(edit.id);
      return [
        { text: editWords(edit) },
        { text: check === undefined ? "nobody" : (nameOf.get(check.user) ?? check.user) },
      ];
    }),
  };
}

function shiftsBlock(record: ReviewRecord): OutlineBlock {
  const loud = (record.comparison?.nets ?? []).filter(
    (row) => row.significant || row.crosses.length > 0,
  );
  if (loud.length === 0) return { kind: "text", text: "No net moved beyond its tolerance band." };
  return {
    kind: "table",
    head: ["Moved beyond its band", "Condition", "Was, V", "Is, V", "Shift, V"],
    widths: [50, 52, 26, 26, 28],
    rows: loud.map((row) => [
      { text: row.net, look: "strong" },
      { text: row.condition },
      { text: voltageWords(row.was), look: "number" },
      { text: voltageWords(row.is), look: row.crosses.length > 0 ? "worse" : "number" },
      { text: shiftWords(row.shift), look: "number" },
    ]),
  };
}

function marginsBlock(record: ReviewRecord): OutlineBlock {
  const rows = [...worstRows(record.result).values()]
    .toSorted((a, b) => (a.margin ?? -2) - (b.margin ?? -2))
    .slice(0, NEAREST);
  return {
    kind: "table",
    head: ["Nearest a derated limit", "Condition", "Margin", "Verdict", "Rule"],
    widths: [56, 40, 22, 20, 44],
    rows: rows.map((row) => [
      { text: row.part, sub: quantityName(row.quantity), look: "strong" },
      { text: row.condition },
      { text: marginWords(row.margin), look: row.verdict === "pass" ? "number" : "worse" },
      { text: row.verdict },
      { text: row.rule.id, sub: `${row.rule.policy}, ${row.rule.status}` },
    ]),
  };
}
