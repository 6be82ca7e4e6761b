/** A bound that a circuit must keep, in SI units; at least one of `min` and `max` is given. */
export interface Limit {
  readonly of:
    | { readonly net: string }
    | { readonly between: readonly [string, string] }
    | { readonly part: string; readonly quantity: string };
  readonly min: number | null;
  readonly max: number | null;
  /** The condition it holds in; null: every one. */
  readonly condition: string | null;
}
