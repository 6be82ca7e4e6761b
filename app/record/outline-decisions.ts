import type { OutlineCell, OutlineSection } from "../../lib/record/record-outline";
import type { ReviewRecord } from "../../lib/record/review-record";
import { anchorWords, numberNow } from "../../lib/review/findings-view";
import type { Decision, Finding } from "../../lib/review/review-state";
import { marginWords, momentWords } from "../wording/numbers";

type Of<K extends Decision["kind"]> = Extract<Decision, { kind: K }>;

/** Section 5: every finding with its number then and now, and how it ended. */
export function findingsSection(record: ReviewRecord): OutlineSection {
  if (record.findings.length === 0)
    return {
      number: 5,
      title: "Findings",
      blocks: [{ kind: "text", text: "No finding was raised." }],
    };
  return {
    number: 5,
    title: "Findings",
    blocks: [
      {
        kind: "table",
        head: ["No.", "Severity", "Finding", "Was, is", "Disposition"],
        widths: [10, 28, 66, 28, 50],
        rows: record.findings.map((finding) => [
          { text: String(finding.number), look: "strong" },
          { text: finding.severity, sub: anchorWords(finding.anchor) },
          {
            text: finding.text,
            sub: finding.remarks
              .map((remark) => `${nameOf(record, remark.author)}: ${remark.text}`)
              .join(" "),
          },
          numbersCell(record, finding),
          { text: disposition(record, finding) },
        ]),
      },
    ],
  };
}

/** Section 6: the waivers that stand, with their reasons. */
export function waiversSection(record: ReviewRecord): OutlineSection {
  const withdrawn = new Set(ofKind(record, "withdrawal").map((decision) => decision.waiver));
  const waivers = ofKind(record, "waiver").filter((waiver) => !withdrawn.has(waiver.number));
  if (waivers.length === 0)
    return { number: 6, title: "Waivers", blocks: [{ kind: "text", text: "None." }] };
  return {
    number: 6,
    title: "Waivers",
    blocks: [
      {
        kind: "table",
        head: ["No.", "For", "Condition", "Margin waived", "Reason", "Granted by"],
        widths: [14, 36, 28, 22, 52, 30],
        rows: waivers.map((waiver) => [
          { text: waiver.number, look: "strong" },
          "part" in waiver.subject
            ? { text: waiver.subject.part, sub: waiver.subject.rule }
            : { text: `limit ${waiver.subject.limit}` },
          { text: waiver.subject.condition },
          { text: marginWords(waiver.margin), look: "number" },
          { text: waiver.reason },
          {
            text: nameOf(record, waiver.user),
            sub: `${momentWords(waiver.at)}, Rev ${waiver.revision}`,
          },
        ]),
      },
      {
        kind: "small",
        text: "A waiver is carried from revision to revision while its number gets no worse.",
      },
    ],
  };
}

/** Section 7: the signatures of this revision, each with its meaning, time and bound digest. */
export function signaturesSection(record: ReviewRecord): OutlineSection {
  const signatures = ofKind(record, "signature").filter(
    (signature) => signature.revision === record.revision.letter,
  );
  return {
    number: 7,
    title: "Signatures",
    blocks: [
      {
        kind: "signatures",
        signatures: signatures.map((signature) => {
          const person = record.people.find((one) => one.id === signature.user);
          return {
            meaning: signature.meaning,
            name: signature.name,
            function: person?.roles.join(", ") ?? "",
            at: `${signature.at.slice(0, 10)} ${signature.at.slice(11, 19)} UTC`,
            method: `${signature.method}. Independent of the author: ${person?.independent === true ? "yes" : "no"}.`,
            digest: `${signature.boundDigest.slice(7, 23)} … ${signature.boundDigest.slice(-8)}`,
          };
        }),
      },
      {
        kind: "small",
        text: "Each signature is bound to the digests of section 1. It is void, and shown as void, when one of them differs.",
      },
    ],
  };
}

function numbersCell(record: ReviewRecord, finding: Finding): OutlineCell {
  if (finding.was === null) return { text: "" };
  const now = numberNow(finding, record.result);
  const was = `was ${finding.was.value.toPrecision(4)} ${finding.was.unit}`;
  return now === null
    ? { text: was, look: "number" }
    : {
        text: `is ${now.value.toPrecision(4)} ${finding.was.unit}`,
        sub: was,
        look: now.past ? "worse" : "number",
      };
}

function disposition(record: ReviewRecord, finding: Finding): string {
  const last = record.decisions
    .filter(
      (decision): decision is Of<"closure"> | Of<"reopening"> =>
        (decision.kind === "closure" || decision.kind === "reopening") &&
        decision.finding === finding.id,
    )
    .at(-1);
  if (last === undefined || last.kind === "reopening") return "Open.";
  const raiser = last.user === finding.author ? ", who raised it" : "";
  return `${last.reason} Closed by ${nameOf(record, last.user)}${raiser}, ${momentWords(last.at)}.`;
}

function ofKind<K extends Decision["kind"]>(record: ReviewRecord, kind: K): readonly Of<K>[] {
  return record.decisions.filter((decision): decision is Of<K> => decision.kind === kind);
}

function nameOf(record: ReviewRecord, user: string): string {
  return record.people.find((person) => person.id === user)?.name ?? user;
}
