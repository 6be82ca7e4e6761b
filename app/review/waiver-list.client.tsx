"use client";

import type { Decision } from "../../lib/review/review-state";
import { type Waiver, type WaiverStanding, waiverStanding } from "../../lib/review/waivers";
import type { CircuitResult } from "../../lib/stress/circuit-result";
import { marginWords } from "../wording/numbers";

/** The waivers of the design, and how each stands in this revision: a waiver lapses when its number gets worse. */
export function WaiverList(props: {
  readonly decisions: readonly Decision[];
  readonly result: CircuitResult | null;
  readonly nameOf: (user: string) => string;
  /** Absent for one who may not take a waiver back. */
  readonly onWithdraw?: ((waiver: string) => void) | undefined;
}) {
  const { decisions, result, onWithdraw } = props;
  const waivers = decisions.filter((decision): decision is Waiver => decision.kind === "waiver");
  if (waivers.length === 0 || result === null) return null;
  return (
    <section className="items">
      <h2 className="cap">Waivers</h2>
      <ul>
        {waivers.map((waiver) => {
          const standing = waiverStanding(waiver, decisions, result);
          const live = standing.kind === "stands" || standing.kind === "lapsed";
          return (
            <li key={waiver.number}>
              <span className={standing.kind === "lapsed" ? "worse" : ""}>
                <b className="num">{waiver.number}</b> {subjectWords(waiver)}:{" "}
                {standingWords(standing)}
              </span>
              <span className="by">
                {waiver.reason} {props.nameOf(waiver.user)}, Rev {waiver.revision}
              </span>
              {live && onWithdraw !== undefined && (
                <button
                  type="button"
                  className="btn quiet"
                  onClick={() => onWithdraw(waiver.number)}
                >
                  withdraw …
                </button>
              )}
            </li>
          );
        })}
      </ul>
    </section>
  );
}

function subjectWords({ subject }: Waiver): string {
  return "part" in subject
    ? `${subject.part}, ${subject.condition}`
    : `limit ${subject.limit}, ${subject.condition}`;
}

function standingWords(standing: WaiverStanding): string {
  switch (standing.kind) {
    case "stands":
      return "stands";
    case "lapsed":
      return `lapsed, ${marginWords(standing.was)} became ${marginWords(standing.is)}`;
    case "withdrawn":
      return "withdrawn";
    case "notNeeded":
      return "not needed here";
  }
}
