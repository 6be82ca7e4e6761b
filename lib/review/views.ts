/** What the server hands to pages, already cut to what the acting member may see. Plain JSON. */
import type { CircuitFile } from "../circuit/circuit-file";
import type { Comparison } from "../comparison/comparison";
import type { CircuitResult } from "../stress/circuit-result";
import type { Decision, Finding, Role } from "./review-state";

export interface PersonView {
  readonly id: string;
  readonly name: string;
  readonly initials: string;
  readonly roles: readonly Role[];
}

/** A solver run as pages show it. */
export interface RunView {
  readonly address: string;
  readonly state: "queued" | "running" | "done" | "failed";
  /** Conditions done, of how many, and the name of the one being solved. */
  readonly done: number;
  readonly of: number;
  readonly at: string | null;
  /** Why it failed, in one sentence. */
  readonly failure: string | null;
}

export interface RevisionView {
  readonly letter: string;
  readonly digest: string;
  readonly changeNote: string;
  /** ISO 8601, UTC */
  readonly frozenAt: string;
  readonly authors: readonly PersonView[];
  readonly state: "underReview" | "released" | "returned" | "superseded";
  readonly releasedAt: string | null;
}

export interface DesignView {
  readonly id: string;
  readonly number: string;
  readonly title: string;
  readonly workspace: string;
  /** Path of the document socket: `/doc/ID`. */
  readonly documentPath: string;
  /** All revisions, oldest first. */
  readonly revisions: readonly RevisionView[];
}

/** The review of one revision against its base. */
export interface ReviewView {
  readonly design: DesignView;
  readonly me: PersonView;
  readonly people: readonly PersonView[];
  readonly proposed: RevisionView;
  readonly proposedFile: CircuitFile;
  readonly run: RunView;
  readonly result: CircuitResult | null;
  /** null for a first issue. */
  readonly base: RevisionView | null;
  readonly baseFile: CircuitFile | null;
  readonly baseResult: CircuitResult | null;
  readonly comparisonRun: RunView;
  readonly comparison: Comparison | null;
  /** As stored when the page was made; the live ones come through the shared document. A released revision's are fixed. */
  readonly findings: readonly Finding[];
  readonly decisions: readonly Decision[];
  readonly newerUnderReview: readonly string[];
  /** Digests that a signature given now would bind. */
  readonly bound: Readonly<Record<string, string | null>>;
}

/** The live draft of a design. */
export interface DraftView {
  readonly design: DesignView;
  readonly me: PersonView;
  readonly people: readonly PersonView[];
  /** Letter that freezing now would give. */
  readonly nextLetter: string;
  readonly mayEdit: boolean;
}

export interface RegisterRow {
  readonly number: string;
  readonly title: string;
  readonly sheetSize: string;
  readonly revisions: readonly { readonly letter: string; readonly state: RevisionView["state"] }[];
  /** In words: `Under review, 2 majors open`. */
  readonly state: string;
  readonly waitsFor: { readonly name: string; readonly to: string } | null;
  /** It waits for the one who looks. */
  readonly waitsForMe: boolean;
  /** Least margin of the latest revision; null where not solved. */
  readonly leastMargin: {
    readonly margin: number;
    readonly part: string;
    readonly waived: boolean;
  } | null;
  /** Where the row leads. */
  readonly href: string;
}

/** Something that waits for the one who looks. */
export interface WaitingCard {
  readonly heading: string;
  readonly text: string;
  readonly why: string;
  readonly action: string;
  readonly href: string;
}

export interface RegisterView {
  readonly me: PersonView;
  readonly workspace: string;
  readonly waiting: readonly WaitingCard[];
  readonly rows: readonly RegisterRow[];
  /** ISO date */
  readonly asOf: string;
}
