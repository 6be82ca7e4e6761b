/** Something in a document that projection had to repair or leave out; never silently. */
export interface ProjectionProblem {
  readonly code: "designatorTwice" | "looseEnd" | "netNamedTwice" | "unreadable";
  readonly block: string;
  readonly message: string;
  readonly part?: string;
  readonly net?: string;
}
