import type { Verdict } from "../../lib/values/verdict";

/** The fields of ISO 7200 that the title block shows. */
export interface TitleFacts {
  readonly owner: string;
  readonly title: string;
  readonly documentType: string;
  readonly creator: string;
  readonly status: string;
  readonly number: string;
  readonly revision: string;
  /** What the date is of: `Proposed`, `Issued`. */
  readonly dated: string;
  readonly date: string;
  readonly sheet: string;
  /** Both absent on a draft: then the block is the short one. */
  readonly criteria?: readonly CriterionLine[];
  readonly signOff?: readonly SignOffLine[];
}

export interface CriterionLine {
  readonly words: string;
  readonly verdict: Verdict;
  /** `4 of 7`, `none`. */
  readonly count: string;
  /** Holds only by waivers, named here: `W-1`. */
  readonly waived?: string;
}

export interface SignOffLine {
  /** `Authored` */
  readonly meaning: string;
  readonly name: string;
  /** null: not signed. */
  readonly signedOn: string | null;
  /** Said instead of a date while it waits: `after review`. */
  readonly waits: string;
  /** The one who looks may sign here. */
  readonly mine: boolean;
}

export interface RevisionRow {
  readonly letter: string;
  readonly change: string;
  readonly date: string;
  readonly by: string;
}
