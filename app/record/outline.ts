import type { OutlineSection, RecordOutline } from "../../lib/record/record-outline";
import type { ReviewRecord } from "../../lib/record/review-record";
import type { SealedRecord } from "../../lib/record/seal";
import { limitSubject } from "../../lib/review/limit-words";
import { settingWords } from "../review/setting-words";
import { criterionWords } from "../wording/criteria";
import { dayWords, tinyWords } from "../wording/numbers";
import { digestGroups } from "./digest-groups";
import { changedSection } from "./outline-changes";
import { findingsSection, signaturesSection, waiversSection } from "./outline-decisions";

/** Lays out a sealed record for reading: nine sections, in the order an auditor asks. */
export function recordOutline(sealed: SealedRecord): RecordOutline {
  const { record } = sealed;
  const against = record.base === null ? ", first issue" : ` against Rev ${record.base.letter}`;
  const waivers = record.criteria.flatMap((criterion) => criterion.waived);
  const released = record.releasedAt;
  return {
    heading: `${record.design.number} Rev ${record.revision.letter}${against}`,
    introduction: `${record.design.title}. Frozen ${dayWords(record.revision.frozenAt)}. Change note: “${record.revision.changeNote}”`,
    outcome: {
      words: released === null ? "Not released" : "Released",
      detail: `${released === null ? "work in progress" : dayWords(released)}, ${waiverCount(new Set(waivers).size)}`,
    },
    sections: [
      standsOnSection(record),
      criteriaSection(record),
      conditionsSection(record),
      changedSection(record),
      findingsSection(record),
      waiversSection(record),
      signaturesSection(record),
      { number: 8, title: "Cautions", blocks: [{ kind: "list", items: record.cautions }] },
      checkSection(sealed),
    ],
    titleBlock: [
      { field: "Legal owner", value: record.design.workspace },
      { field: "Title", value: record.design.title },
      { field: "Document type", value: "Review record" },
      { field: "Number", value: record.design.number },
      { field: "Rev", value: record.revision.letter },
      { field: "Date of issue", value: dayWords(released ?? record.drawnUpAt) },
    ],
  };
}

function waiverCount(count: number): string {
  if (count === 0) return "no waiver";
  return count === 1 ? "with 1 waiver" : `with ${count} waivers`;
}

function standsOnSection(record: ReviewRecord): OutlineSection {
  const policy = record.revision.circuit.policy?.use ?? "common-practice";
  const rows = [
    [`Circuit, Rev ${record.revision.letter}`, record.bound.circuit],
    ...(record.base === null
      ? []
      : [[`Base circuit, Rev ${record.base.letter}`, record.base.digest]]),
    [`Results, engine ${record.engine}`, record.bound.results],
    [`Policy: ${policy}`, record.bound.policy],
    ["Findings", record.bound.findings],
    ["Decisions", record.bound.decisions],
  ];
  return {
    number: 1,
    title: "What this record stands on",
    blocks: [
      {
        kind: "table",
        head: [],
        widths: [42, 140],
        rows: rows.map(([what, digest]) => [
          { text: what ?? "" },
          { text: digestGroups(digest ?? ""), look: "number" },
        ]),
      },
    ],
  };
}

function criteriaSection(record: ReviewRecord): OutlineSection {
  return {
    number: 2,
    title: "Exit criteria, computed",
    blocks: [
      {
        kind: "table",
        head: ["Criterion", "Counted", "Note"],
        widths: [100, 24, 58],
        rows: record.criteria.map((criterion) => [
          {
            text: criterionWords[criterion.id],
            mark:
              criterion.verdict === "pass"
                ? "met"
                : criterion.verdict === "fail"
                  ? "notMet"
                  : "unknown",
          },
          { text: `${criterion.met} of ${criterion.of}`, look: "number" },
          {
            text: [
              ...criterion.waived.map((waiver) => `by waiver ${waiver}`),
              ...criterion.open.slice(0, 3),
            ].join("; "),
          },
        ]),
      },
    ],
  };
}

function conditionsSection(record: ReviewRecord): OutlineSection {
  return {
    number: 3,
    title: "Conditions, certificates and limits",
    blocks: [
      {
        kind: "table",
        head: [
          "Condition",
          "Setting",
          "Status",
          "Kirchhoff residual",
          "Power balance",
          "Error bound",
          "Iterations",
        ],
        widths: [36, 40, 24, 30, 28, 26, 20],
        rows: record.result.conditions.map((condition) => [
          { text: condition.name },
          { text: settingWords(record.revision.circuit, condition.name), look: "number" },
          { text: condition.status },
          {
            text:
              condition.certificate === null
                ? "none"
                : tinyWords(condition.certificate.kclResidual),
            look: "number",
          },
          {
            text:
              condition.certificate === null
                ? "none"
                : tinyWords(condition.certificate.powerBalance),
            look: "number",
          },
          {
            text:
              condition.certificate === null ? "none" : tinyWords(condition.certificate.errorBound),
            look: "number",
          },
          {
            text: condition.certificate === null ? "" : String(condition.certificate.iterations),
            look: "number",
          },
        ]),
      },
      {
        kind: "table",
        head: ["Limit", "Condition", "Allowed", "Lowest", "Highest", "Verdict"],
        widths: [36, 44, 40, 24, 24, 24],
        rows: record.result.limits.map((row) => [
          { text: limitSubject(row) },
          { text: row.condition },
          { text: `${row.min ?? "any"} to ${row.max ?? "any"}`, look: "number" },
          { text: row.low === null ? "?" : row.low.toPrecision(5), look: "number" },
          { text: row.high === null ? "?" : row.high.toPrecision(5), look: "number" },
          { text: row.verdict, look: row.verdict === "pass" ? "number" : "worse" },
        ]),
      },
    ],
  };
}

function checkSection(sealed: SealedRecord): OutlineSection {
  const { number } = sealed.record.design;
  const { letter } = sealed.record.revision;
  return {
    number: 9,
    title: "Check this record",
    blocks: [
      {
        kind: "table",
        head: [],
        widths: [60, 122],
        rows: [
          [
            { text: "Record digest, SHA-256" },
            { text: digestGroups(sealed.digest), look: "number" },
          ],
          [
            { text: "Workspace key, Ed25519, RFC 7638 thumbprint" },
            { text: sealed.seal.fingerprint, look: "number" },
          ],
        ],
      },
      {
        kind: "small",
        text: `Offline: npm run --silent verify -- ${number}-${letter}.record.json checks digest, signatures and audit chain, and solves the circuit again.`,
      },
    ],
  };
}
