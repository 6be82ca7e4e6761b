"use client";

import { useRef } from "react";
import type { CircuitResult } from "../../lib/stress/circuit-result";
import type { PreviewAnswer } from "../preview/preview-answer";

/** The newest solved result, and the one before it: what an edit moved. A draft that cannot be solved keeps the last one. */
export function useLastResult(answer: PreviewAnswer | null): {
  readonly result: CircuitResult | null;
  readonly before: CircuitResult | null;
} {
  const held = useRef<{ result: CircuitResult | null; before: CircuitResult | null }>({
    result: null,
    before: null,
  });
  if (answer?.kind === "solved" && answer.result !== held.current.result) {
    const last = held.current.result;
    // Moving a part on the sheet leaves the circuit as it was; what moved before stays in sight.
    const same = last?.electricalDigest === answer.result.electricalDigest;
    held.current = { result: answer.result, before: same ? held.current.before : last };
  }
  return held.current;
}
