import type { CircuitFile } from "../circuit/circuit-file";

/** Quiet: inside the band. Moved: beyond it. Past: over a limit. */
export type ReadingLevel = "quiet" | "moved" | "past";

/** What is known about a circuit and drawn on its sheet. All of it may be left out. Numbers come in words, with units. */
export interface SheetFacts {
  /** The block to draw; the file's top block where absent. */
  readonly block?: string;
  /** What was before: parts that it alone has are drawn crossed, values that differ are struck. */
  readonly base?: CircuitFile | null;
  /** Letter in the triangles of what changed. */
  readonly revision?: string;
  /** Parts to put a cloud around. */
  readonly edited?: readonly string[];
  readonly netReadings?: readonly NetReading[];
  readonly partReadings?: readonly PartReading[];
  readonly findings?: readonly FindingMark[];
  /** Parts that someone has checked. */
  readonly checked?: readonly string[];
  /** `full` has exit criteria and sign-off above the fields; a draft's is `short`. */
  readonly titleBlock?: "full" | "short";
  /** Rows of the revision block. */
  readonly revisionRows?: number;
}

interface Reading {
  readonly level: ReadingLevel;
  /** `6.021 V` */
  readonly is: string;
  /** `5.734` */
  readonly was?: string;
  /** `+0.287` */
  readonly shift?: string;
}

export interface NetReading extends Reading {
  readonly net: string;
}

export interface PartReading extends Reading {
  readonly part: string;
  /** `Q1 junct.` */
  readonly caption: string;
}

export interface FindingMark {
  readonly id: string;
  readonly number: number;
  readonly severity: "major" | "minor" | "observation" | "question";
  readonly anchor: { readonly net: string } | { readonly part: string };
}
