import * as Y from "yjs";
import type { Role } from "../review/review-state";

/** Of the content; a page that knows less than the document's refuses to write. */
export const SCHEMA = 1;

/** The top-level types of a design's shared document. */
export const TOP_LEVEL = [
  "design",
  "blocks",
  "parts",
  "junctions",
  "wires",
  "labels",
  "texts",
  "conditions",
  "limits",
  "policy",
  "findings",
  "decisions",
] as const;

export type TopLevel = (typeof TOP_LEVEL)[number];

/** Types that hold the circuit: designers write them, and undo reaches them. */
export const CIRCUIT_TYPES = TOP_LEVEL.filter(
  (name) => name !== "findings" && name !== "decisions",
);

/*
 * Who may write:
 * [WW1] the circuit types: designers
 * [WW2] findings: designers, reviewers and approvers, each entry under the own name
 * [WW3] decisions: the server alone
 */

/** Whether a person with these roles may write a top-level type. Nobody but the server writes decisions. */
export function mayWrite(name: TopLevel, roles: readonly Role[]): boolean {
  if (name === "decisions") return false;
  if (name === "findings") return roles.some((role) => role !== "observer");
  return roles.includes("designer");
}

/** A top-level map of a document. */
export function topLevel(doc: Y.Doc, name: TopLevel): Y.Map<unknown> {
  return doc.getMap(name);
}

/** The maps of a collection with their ids, sorted by id; entries of another shape are passed over. */
export function entriesOf(
  collection: Y.Map<unknown>,
): readonly (readonly [string, Y.Map<unknown>])[] {
  return [...collection.entries()]
    .flatMap(([id, value]): (readonly [string, Y.Map<unknown>])[] =>
      value instanceof Y.Map ? [[id, value]] : [],
    )
    .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
}

/** An id that no other entry has. */
export function freshId(): string {
  return crypto.randomUUID().replaceAll("-", "").slice(0, 20);
}
