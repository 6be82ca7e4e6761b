import { digest } from "../circuit/digest";

/** The things a signature stands on. Digests are `sha256:…`; null where there is none (a first issue has no base). */
export interface BoundThings {
  readonly circuit: string;
  readonly base: string | null;
  /** Digest of the solver's whole result. */
  readonly results: string;
  readonly policy: unknown;
  readonly findings: readonly { readonly id: string }[];
  readonly decisions: readonly { readonly id: string; readonly kind: string }[];
}

/** The digest of each bound thing, so that a refusal can say which one changed. */
export interface BoundDigests {
  readonly circuit: string;
  readonly base: string | null;
  readonly results: string;
  readonly policy: string;
  readonly findings: string;
  readonly decisions: string;
}

/**
 * Digests of what a signature binds. Signatures and releases are left out of the decisions: each
 * later signature would else void the earlier one. So are decisions about other revisions' checks.
 */
export function boundDigests(things: BoundThings): BoundDigests {
  return {
    circuit: things.circuit,
    base: things.base,
    results: things.results,
    policy: digest(things.policy),
    findings: digest([...things.findings].sort(byId)),
    decisions: digest(
      things.decisions
        .filter((decision) => decision.kind !== "signature" && decision.kind !== "release")
        .toSorted(byId),
    ),
  };
}

/**
 * The one digest that a signature stores: over the bound digests and the signature's meaning. An
 * author vouches for the circuit as it was submitted; findings and decisions come afterwards, and
 * bind those who review and approve.
 */
export function boundDigest(digests: BoundDigests, meaning: string): string {
  const { circuit, base, results, policy } = digests;
  return meaning === "authored"
    ? digest({ circuit, base, results, policy, meaning })
    : digest({ ...digests, meaning });
}

function byId(a: { readonly id: string }, b: { readonly id: string }): number {
  return a.id < b.id ? -1 : a.id > b.id ? 1 : 0;
}
