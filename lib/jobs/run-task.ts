/** What a solving thread is asked, and what it answers. */
export interface RunTask {
  readonly kind: string;
  readonly proposed: string;
  readonly base: string | null;
}

export type RunOutcome =
  | { readonly kind: "done"; readonly result: string; readonly resultDigest: string }
  | { readonly kind: "failed"; readonly sentence: string };

export interface RunProgress {
  readonly done: number;
  readonly of: number;
  readonly at: string | null;
}
