import * as Y from "yjs";
import type { Anchor, Decision, Finding, Remark, Severity, Was } from "../review/review-state";
import { numberOf, objectOf, textOf } from "./plain";
import { entriesOf, freshId, topLevel } from "./shape";

/** Writes a finding; it is immutable from then on but for remarks. @returns its id */
export function raiseFinding(
  doc: Y.Doc,
  finding: {
    readonly anchor: Anchor;
    readonly severity: Severity;
    readonly text: string;
    readonly was: Was | null;
    readonly revision: string;
    readonly author: string;
    /** ISO 8601, UTC */
    readonly at: string;
  },
): string {
  const id = freshId();
  doc.transact(() => {
    const map = new Y.Map<unknown>();
    for (const [key, value] of Object.entries(finding)) map.set(key, value);
    map.set("remarks", new Y.Array());
    topLevel(doc, "findings").set(id, map);
  });
  return id;
}

/** Appends a remark to a finding. */
export function addRemark(
  doc: Y.Doc,
  finding: string,
  remark: { readonly author: string; readonly at: string; readonly text: string },
): void {
  const map = topLevel(doc, "findings").get(finding);
  const remarks = map instanceof Y.Map ? map.get("remarks") : null;
  if (remarks instanceof Y.Array) doc.transact(() => remarks.push([{ id: freshId(), ...remark }]));
}

/**
 * The findings of a document by number; what is no finding is passed over. Numbers follow the order they
 * were raised in, but those that a release has settled stay: a finding that is merged late, whatever its date, comes after.
 */
export function readFindings(doc: Y.Doc): readonly Finding[] {
  const settled = new Map(
    readDecisions(doc).flatMap((decision) =>
      decision.kind === "release"
        ? decision.findings.map((one): [string, number] => [one.id, one.number])
        : [],
    ),
  );
  let last = Math.max(0, ...settled.values());
  return entriesOf(topLevel(doc, "findings"))
    .flatMap(([id, map]): Omit<Finding, "number">[] => {
      const anchor = anchorOf(map.get("anchor"));
      const severity = severityOf(map.get("severity"));
      const [text, author, at, revision] = ["text", "author", "at", "revision"].map((key) =>
        textOf(map.get(key)),
      );
      if (anchor === null || severity === null || text == null || author == null) return [];
      return [
        {
          id,
          anchor,
          severity,
          text,
          author,
          at: at ?? "",
          revision: revision ?? "",
          was: wasOf(map.get("was")),
          remarks: remarksOf(map.get("remarks")),
        },
      ];
    })
    .sort((a, b) => (a.at === b.at ? (a.id < b.id ? -1 : 1) : a.at < b.at ? -1 : 1))
    .map((finding) => {
      const number = settled.get(finding.id);
      if (number !== undefined) return { ...finding, number };
      last += 1;
      return { ...finding, number: last };
    })
    .sort((a, b) => a.number - b.number);
}

/** The decisions that the server has mirrored, oldest first. */
export function readDecisions(doc: Y.Doc): readonly Decision[] {
  return [...topLevel(doc, "decisions").values()]
    .filter(isDecision)
    .sort((a, b) => (a.at === b.at ? (a.id < b.id ? -1 : 1) : a.at < b.at ? -1 : 1));
}

/** The server alone writes decisions, from typed ones: kind and outline tell enough. */
function isDecision(value: unknown): value is Decision {
  const decision = objectOf(value);
  return (
    textOf(decision?.["id"]) !== null &&
    textOf(decision?.["kind"]) !== null &&
    textOf(decision?.["user"]) !== null &&
    textOf(decision?.["at"]) !== null
  );
}

function anchorOf(value: unknown): Anchor | null {
  const anchor = objectOf(value);
  for (const key of ["net", "part", "condition", "limit"] as const) {
    const name = textOf(anchor?.[key]);
    if (name === null) continue;
    if (key === "net") return { net: name };
    if (key === "part") return { part: name };
    return key === "condition" ? { condition: name } : { limit: name };
  }
  return null;
}

function severityOf(value: unknown): Severity | null {
  return value === "major" || value === "minor" || value === "observation" || value === "question"
    ? value
    : null;
}

function wasOf(value: unknown): Was | null {
  const was = objectOf(value);
  const number = numberOf(was?.["value"]);
  if (was === null || number === null) return null;
  return {
    quantity: textOf(was["quantity"]) ?? "",
    condition: textOf(was["condition"]) ?? "",
    value: number,
    unit: textOf(was["unit"]) ?? "",
    revision: textOf(was["revision"]) ?? "",
  };
}

function remarksOf(value: unknown): readonly Remark[] {
  if (!(value instanceof Y.Array)) return [];
  return value.toArray().flatMap((entry: unknown): readonly Remark[] => {
    const remark = objectOf(entry);
    const [id, author, at, text] = ["id", "author", "at", "text"].map((key) =>
      textOf(remark?.[key]),
    );
    return id == null || author == null || text == null ? [] : [{ id, author, at: at ?? "", text }];
  });
}
