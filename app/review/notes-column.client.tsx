"use client";

import type { ReactNode } from "react";
import { anchorWords, numberNow } from "../../lib/review/findings-view";
import type { Finding } from "../../lib/review/review-state";
import type { ReviewView } from "../../lib/review/views";
import type { SheetDrawing } from "../../lib/sheet/sheet-drawing";
import type { Selection } from "../sheet/selection";
import { Note, type NoteFacts } from "./note.client";
import type { Asked } from "./review-dialogs.client";
import type { ReviewStanding } from "./review-standing";
import type { ReviewSession } from "./session";
import { WaiverList } from "./waiver-list.client";

/** The slips beside the sheet: findings by number, then what changed and who checked it. */
export function NotesColumn(props: {
  readonly view: ReviewView;
  readonly session: ReviewSession;
  readonly standing: ReviewStanding;
  readonly drawing: SheetDrawing;
  readonly openFinding: string | null;
  readonly onOpen: (finding: string | null) => void;
  readonly onAsk: (asked: Asked) => void;
  readonly onSelect: (selection: Selection) => void;
  readonly children: ReactNode;
}) {
  const { view, session, standing, openFinding } = props;
  const nameOf = (user: string): string =>
    view.people.find((person) => person.id === user)?.name ?? "someone who has left";
  return (
    <aside className="notes" aria-label="Findings">
      <div className="slipcolumn">
        {session.findings.map((finding) => (
          <Note
            key={finding.id}
            finding={finding}
            facts={factsOf(finding, props, nameOf)}
            on={finding.id === openFinding}
            nameOf={nameOf}
            onSelect={() => {
              props.onOpen(finding.id === openFinding ? null : finding.id);
              if ("net" in finding.anchor || "part" in finding.anchor)
                props.onSelect(finding.anchor);
            }}
            onRemark={standing.mayRemark ? (text) => session.remark(finding.id, text) : null}
            onClose={() =>
              props.onAsk({ kind: "close", finding: finding.id, number: finding.number })
            }
            onReopen={() =>
              props.onAsk({ kind: "reopen", finding: finding.id, number: finding.number })
            }
          />
        ))}
        {session.findings.length === 0 && (
          <p className="none">
            No finding yet. Choose a net or a part and press New finding to raise the first.
          </p>
        )}
        {props.children}
        <WaiverList
          decisions={session.decisions}
          result={view.result}
          nameOf={nameOf}
          onWithdraw={
            standing.open && view.me.roles.includes("approver")
              ? (waiver) => props.onAsk({ kind: "withdraw", waiver })
              : undefined
          }
        />
        {standing.mayReturn && (
          <button type="button" className="btn" onClick={() => props.onAsk({ kind: "return" })}>
            Return revision …
          </button>
        )}
      </div>
    </aside>
  );
}

function factsOf(
  finding: Finding,
  props: {
    readonly view: ReviewView;
    readonly standing: ReviewStanding;
    readonly drawing: SheetDrawing;
  },
  nameOf: (user: string) => string,
): NoteFacts {
  const { view, standing, drawing } = props;
  const now = numberNow(finding, view.result);
  const base =
    finding.revision === view.proposed.letter ? numberNow(finding, view.baseResult) : null;
  const unit = finding.was?.unit ?? "";
  const was = base?.value ?? finding.was?.value ?? null;
  const closure = standing.closures.get(finding.id) ?? null;
  const moved = was !== null && now !== null && Math.abs(was - now.value) > 1e-9;
  return {
    zone: zoneOf(finding, drawing),
    anchor: anchorWords(finding.anchor),
    was: moved ? short(was) : null,
    is: now === null ? null : `${short(now.value)} ${unit}`.trim(),
    isPast: now?.past ?? false,
    backInside: finding.revision !== view.proposed.letter && now !== null && !now.past && moved,
    closed: closure === null ? null : { by: nameOf(closure.user), reason: closure.reason },
    mayClose: closure === null && standing.mayClose(finding),
    mayReopen: closure !== null && standing.mayClose(finding),
  };
}

function short(value: number): string {
  return value.toPrecision(4).replace("-", "\u2212");
}

function zoneOf(finding: Finding, drawing: SheetDrawing): string {
  const { anchor } = finding;
  if ("part" in anchor) return drawing.parts.find((part) => part.ref === anchor.part)?.zone ?? "";
  if ("net" in anchor) return drawing.nets.find((net) => net.net === anchor.net)?.zone ?? "";
  return "";
}
