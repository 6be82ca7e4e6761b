import type { FileProblem } from "../../../lib/values/problem";

/** A design was made, or why not; a bad file comes with every problem and its place. */
export type NewDesignDeed =
  | { readonly done: true; readonly number: string }
  | {
      readonly done: false;
      readonly message: string;
      readonly problems: readonly FileProblem[];
    };
