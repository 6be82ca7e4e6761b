"use client";

import { boundDigests } from "../../lib/record/bound-digest";
import { limitMargin, limitSubject } from "../../lib/review/limit-words";
import type { Decision, Finding, Was } from "../../lib/review/review-state";
import type { ReviewView } from "../../lib/review/views";
import type { LimitRow, StressRow } from "../../lib/stress/circuit-result";
import { Dialog } from "../dialog/dialog.client";
import { ReasonDialog } from "../dialog/reason-dialog.client";
import type { Selection } from "../sheet/selection";
import { marginWords, voltageWords } from "../wording/numbers";
import { quantityName, quantityUnit } from "../wording/quantities";
import { FindingDialog } from "./finding-dialog.client";
import type { ReviewActions } from "./review-actions";
import type { ReviewSession } from "./session";
import { type Meaning, SignDialog } from "./sign-dialog.client";
import { worstRows } from "./stress-lines";

/** What a review page may ask a person before it does it. */
export type Asked =
  | { readonly kind: "finding"; readonly selection: Selection }
  | { readonly kind: "close"; readonly finding: string; readonly number: number }
  | { readonly kind: "reopen"; readonly finding: string; readonly number: number }
  | { readonly kind: "waive"; readonly row: StressRow }
  | { readonly kind: "waiveLimit"; readonly row: LimitRow }
  | { readonly kind: "withdraw"; readonly waiver: string }
  | { readonly kind: "sign"; readonly meaning: Meaning }
  | { readonly kind: "return" }
  | { readonly kind: "refusal"; readonly message: string };

/** The one dialog that is open. */
export function ReviewDialogs(props: {
  readonly asked: Asked;
  readonly view: ReviewView;
  readonly session: ReviewSession;
  readonly actions: ReviewActions;
  readonly condition: string;
  readonly onClose: () => void;
}) {
  const { asked, view, session, actions, condition, onClose } = props;
  const letter = view.proposed.letter;
  switch (asked.kind) {
    case "finding": {
      const was = numberAt(view, asked.selection, condition);
      return (
        <FindingDialog
          anchor={
            "net" in asked.selection ? `net ${asked.selection.net}` : `part ${asked.selection.part}`
          }
          was={was}
          wasWords={was === null ? null : wasWords(was)}
          onRaise={(severity, text) =>
            session.raise({ anchor: asked.selection, severity, text, was, revision: letter })
          }
          onClose={onClose}
        />
      );
    }
    case "close":
      return (
        <ReasonDialog
          title={`Close finding ${asked.number}`}
          explanation="Say why nothing more needs to be done. The words go into the record with your name."
          label="Disposition"
          action="Close finding"
          onDo={(reason) => actions.close(asked.finding, reason)}
          onClose={onClose}
        />
      );
    case "reopen":
      return (
        <ReasonDialog
          title={`Reopen finding ${asked.number}`}
          explanation="Say what has come up since it was closed."
          label="Reason"
          action="Reopen finding"
          onDo={(reason) => actions.reopen(asked.finding, reason)}
          onClose={onClose}
        />
      );
    case "waive":
      return (
        <ReasonDialog
          title={`Waive ${asked.row.part} ${quantityName(asked.row.quantity)}`}
          explanation={`${marginWords(asked.row.margin)} in ${asked.row.condition}, by rule ${asked.row.rule.id}. The waiver stands in later revisions while the number gets no worse.`}
          label="Why this may stand"
          action="Grant waiver"
          onDo={(reason) =>
            actions.waive(
              {
                part: asked.row.part,
                rule: asked.row.rule.id,
                condition: asked.row.condition,
              },
              asked.row.margin,
              reason,
            )
          }
          onClose={onClose}
        />
      );
    case "waiveLimit":
      return (
        <ReasonDialog
          title={`Waive the limit of ${limitSubject(asked.row)}`}
          explanation={`${marginWords(limitMargin(asked.row))} in ${asked.row.condition}. The waiver stands in later revisions while the number gets no worse.`}
          label="Why this may stand"
          action="Grant waiver"
          onDo={(reason) =>
            actions.waive(
              { limit: limitSubject(asked.row), condition: asked.row.condition },
              limitMargin(asked.row),
              reason,
            )
          }
          onClose={onClose}
        />
      );
    case "withdraw":
      return (
        <ReasonDialog
          title={`Withdraw ${asked.waiver}`}
          explanation="What it covered stands open again in every revision under review."
          label="Reason"
          action="Withdraw waiver"
          onDo={(reason) => actions.withdraw(asked.waiver, reason)}
          onClose={onClose}
        />
      );
    case "sign":
      return (
        <SignDialog
          revision={letter}
          meaning={asked.meaning}
          digest={view.proposed.digest}
          onSign={(password) =>
            actions.sign(
              asked.meaning,
              password,
              boundNow(view, session.findings, session.decisions),
            )
          }
          onClose={onClose}
        />
      );
    case "return":
      return (
        <ReasonDialog
          title={`Return Rev ${letter} to its authors`}
          explanation="The revision stays as it is and is marked returned; the designers go on from the draft."
          label="What must change"
          action="Return revision"
          onDo={(reason) => actions.giveBack(reason)}
          onClose={onClose}
        />
      );
    case "refusal":
      return (
        <Dialog title="Not done" onClose={onClose}>
          <p>{asked.message}</p>
          <div className="acts">
            <button type="button" className="btn main" onClick={onClose}>
              Go back
            </button>
          </div>
        </Dialog>
      );
  }
}

/** The digests of what the person sees now: findings and decisions as they have come to this page. */
function boundNow(
  view: ReviewView,
  findings: readonly Finding[],
  decisions: readonly Decision[],
): Readonly<Record<string, string | null>> {
  const live = boundDigests({
    circuit: view.proposed.digest,
    base: view.base?.digest ?? null,
    results: "",
    policy: null,
    findings,
    decisions,
  });
  return { ...view.bound, findings: live.findings, decisions: live.decisions };
}

/** The number a finding at this place would be about. */
function numberAt(view: ReviewView, selection: Selection, condition: string): Was | null {
  const revision = view.proposed.letter;
  if ("net" in selection) {
    const value = view.result?.conditions.find((one) => one.name === condition)?.nets[
      selection.net
    ];
    return value === null || value === undefined
      ? null
      : { quantity: "voltage", condition, value, unit: "V", revision };
  }
  const rows = [...worstRows(view.result).values()].filter((row) => row.part === selection.part);
  const worst = rows.toSorted((a, b) => (a.margin ?? -2) - (b.margin ?? -2))[0];
  if (worst === undefined || worst.applied === null) return null;
  return {
    quantity: worst.quantity,
    condition: worst.condition,
    value: worst.applied,
    unit: quantityUnit(worst.quantity),
    revision,
  };
}

function wasWords(was: Was): string {
  return was.quantity === "voltage" && was.unit === "V"
    ? `${voltageWords(was.value)} V`
    : `${quantityName(was.quantity)} ${was.value.toPrecision(4)} ${was.unit}`;
}
