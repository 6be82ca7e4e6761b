/** The record laid out for reading, once: the page and the PDF draw the same outline. */
export interface RecordOutline {
  readonly heading: string;
  readonly introduction: string;
  readonly outcome: { readonly words: string; readonly detail: string };
  readonly sections: readonly OutlineSection[];
  /** ISO 7200 fields of the title block. */
  readonly titleBlock: readonly { readonly field: string; readonly value: string }[];
}

export interface OutlineSection {
  readonly number: number;
  readonly title: string;
  readonly blocks: readonly OutlineBlock[];
}

export type OutlineBlock =
  | {
      readonly kind: "table";
      readonly head: readonly string[];
      readonly rows: readonly (readonly OutlineCell[])[];
      /** Relative widths of the columns. */
      readonly widths: readonly number[];
    }
  | { readonly kind: "text"; readonly text: string }
  | { readonly kind: "small"; readonly text: string }
  | { readonly kind: "list"; readonly items: readonly string[] }
  | { readonly kind: "signatures"; readonly signatures: readonly OutlineSignature[] };

export interface OutlineCell {
  readonly text: string;
  /** A second line under it. */
  readonly sub?: string;
  readonly look?: "number" | "struck" | "worse" | "strong";
  readonly mark?: "met" | "notMet" | "unknown";
}

export interface OutlineSignature {
  readonly meaning: string;
  readonly name: string;
  readonly function: string;
  readonly at: string;
  readonly method: string;
  readonly digest: string;
}
