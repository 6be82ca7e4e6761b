import type { CircuitResult } from "../../lib/stress/circuit-result";
import type { FileProblem } from "../../lib/values/problem";

/** What the browser's own engine says of a draft: a result with its certificates, or why there is none. */
export type PreviewAnswer =
  | { readonly kind: "solved"; readonly result: CircuitResult; readonly milliseconds: number }
  | { readonly kind: "badFile"; readonly problems: readonly FileProblem[] };

/** A question to the preview worker; answers bear the same number. */
export interface PreviewQuestion {
  readonly number: number;
  readonly file: unknown;
}

export interface PreviewReply {
  readonly number: number;
  readonly answer: PreviewAnswer;
}
