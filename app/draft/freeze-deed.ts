import type { Deed } from "../dialog/deed";

/** Freezing gives a letter, or says why not. */
export type FreezeDeed =
  | { readonly done: true; readonly letter: string }
  | Extract<Deed, { done: false }>;
