import { describe, expect, it } from "vitest";
import { exitCriteria } from "../../lib/review/exit-criteria";
import { mayDecideFinding } from "../../lib/review/finding-states";
import { maySign, type Signature } from "../../lib/review/signing";
import { state } from "./small-review";

const major = { severity: "major", author: "idris" } as const;

describe("signing", () => {
  const signature = (meaning: Signature["meaning"]): Signature => ({
    id: meaning,
    kind: "signature",
    user: "x",
    at: "2026-12-01T08:00:00.000Z",
    revision: "D",
    meaning,
    boundDigest: "",
    method: "password",
    name: "X",
  });
  const signedState = (
    signed: readonly Signature["meaning"][],
    criteria = exitCriteria(state),
  ) => ({
    underReview: true,
    authors: ["mara"],
    criteria,
    signatures: signed.map(signature),
  });
  const mara = { id: "mara", roles: ["designer", "reviewer", "approver"] as const };
  const idris = { id: "idris", roles: ["reviewer"] as const };
  const tove = { id: "tove", roles: ["approver"] as const };

  it("goes author, reviewer, approver, and never twice or by the author", () => {
    expect(maySign("authored", mara, signedState([])).ok).toBe(true);
    expect(maySign("authored", idris, signedState([]))).toMatchObject({
      error: { kind: "notAnAuthor" },
    });
    expect(maySign("reviewed", idris, signedState([]))).toMatchObject({
      error: { kind: "waitsFor" },
    });
    expect(maySign("reviewed", idris, signedState(["authored"])).ok).toBe(true);
    expect(maySign("reviewed", mara, signedState(["authored"]))).toMatchObject({
      error: { kind: "authorOfIt" },
    });
    expect(maySign("approved", mara, signedState(["authored", "reviewed"]))).toMatchObject({
      error: { kind: "authorOfIt" },
    });
    expect(maySign("approved", idris, signedState(["authored", "reviewed"]))).toMatchObject({
      error: { kind: "notAnApprover" },
    });
    expect(maySign("approved", tove, signedState(["authored"]))).toMatchObject({
      error: { kind: "waitsFor" },
    });
    expect(maySign("approved", tove, signedState(["authored", "reviewed"])).ok).toBe(true);
    expect(
      maySign("approved", tove, signedState(["authored", "reviewed", "approved"])),
    ).toMatchObject({
      error: { kind: "alreadySigned" },
    });
  });

  it("approves nothing while a criterion stands open", () => {
    const open = exitCriteria({ ...state, newerUnderReview: ["E"] });
    expect(maySign("approved", tove, signedState(["authored", "reviewed"], open))).toMatchObject({
      error: { kind: "criteriaOpen" },
    });
    expect(maySign("approved", tove, signedState(["authored", "reviewed"], []))).toMatchObject({
      error: { kind: "criteriaOpen" },
    });
  });

  it("leaves a major finding to who raised it and to approvers", () => {
    expect(mayDecideFinding(major, idris)).toBe(true);
    expect(mayDecideFinding(major, tove)).toBe(true);
    expect(mayDecideFinding(major, { id: "jonas", roles: ["reviewer", "designer"] })).toBe(false);
    expect(
      mayDecideFinding({ ...major, severity: "question" }, { id: "jonas", roles: ["designer"] }),
    ).toBe(true);
  });
});
