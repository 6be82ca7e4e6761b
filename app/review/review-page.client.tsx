"use client";

import { useMemo, useState } from "react";
import { conditionMargins } from "../../lib/review/condition-margins";
import type { ReviewView } from "../../lib/review/views";
import { drawSheet } from "../../lib/sheet/layout";
import type { Deed } from "../dialog/deed";
import { Mast } from "../mast/mast";
import { Presence } from "../mast/presence";
import { SaveMark } from "../mast/save-mark";
import type { Selection } from "../sheet/selection";
import { SheetView } from "../sheet/sheet-view.client";
import { ItemsToCheck } from "./items-to-check.client";
import { netRows } from "./net-rows";
import { NotesColumn } from "./notes-column.client";
import type { ReviewActions } from "./review-actions";
import { type Asked, ReviewDialogs } from "./review-dialogs.client";
import { ReviewLedger } from "./review-ledger.client";
import { reviewStanding } from "./review-standing";
import { revisionRows, titleFacts } from "./review-title";
import { Ruler } from "./ruler.client";
import { RunProgress } from "./run-progress.client";
import { settingWords } from "./setting-words";
import { sheetFactsOfReview } from "./sheet-facts-of-review";
import { stressLines } from "./stress-lines";
import { Strip } from "./strip.client";
import { useReviewSession } from "./use-review-session.client";

/** A review: one revision against its base, on the sheet, in the ledger, in findings and exit criteria. */
export function ReviewPage(props: { readonly view: ReviewView; readonly actions: ReviewActions }) {
  const { view, actions } = props;
  const session = useReviewSession(view);
  const standing = useMemo(
    () => reviewStanding(view, session.findings, session.decisions),
    [view, session.findings, session.decisions],
  );
  const names = (view.proposedFile.conditions ?? [{ name: "Nominal" }]).map((one) => one.name);
  const [condition, setCondition] = useState(() => standing.worstCondition ?? names[0] ?? "");
  const [selection, setSelection] = useState<Selection | null>(null);
  const [openFinding, setOpenFinding] = useState<string | null>(null);
  const [asked, setAsked] = useState<Asked | null>(null);

  const select = (wanted: Selection | null): void => {
    setSelection(wanted);
    session.show(wanted);
  };
  const { result, comparison } = view;
  const rows = useMemo(
    () => (result === null ? [] : netRows(result, view.baseResult, comparison, condition)),
    [result, view.baseResult, comparison, condition],
  );
  const lines = useMemo(
    () => (result === null ? [] : stressLines(result, view.baseResult, standing.waiverOfRow)),
    [result, view.baseResult, standing],
  );
  const drawing = useMemo(
    () =>
      drawSheet(
        view.proposedFile,
        sheetFactsOfReview(view, condition, rows, lines, session.findings, standing.checkedParts),
      ),
    [view, condition, rows, lines, session.findings, standing],
  );
  const stops = names.map((name) => ({
    name,
    setting: settingWords(view.proposedFile, name),
    solved: result?.conditions.find((one) => one.name === name)?.status === "solved",
    margins: result === null ? [] : conditionMargins(result, name, standing.isWaived),
  }));
  // Before anything is chosen the strip tells of the loudest net.
  const wantedNet = selection !== null && "net" in selection ? selection.net : rows[0]?.net;
  const selectedNet = rows.find((row) => row.net === wantedNet) ?? null;

  return (
    <>
      <Mast
        number={view.design.number}
        title={view.design.title}
        subtitle={
          view.base === null
            ? `Rev ${view.proposed.letter}, first issue`
            : `Rev ${view.proposed.letter} against Rev ${view.base.letter}`
        }
        cells={
          <>
            <SaveMark state={session.save} />
            <Presence people={session.people} />
          </>
        }
        actions={
          <>
            <a
              className="btn"
              href={`/designs/${view.design.number}/reviews/${view.proposed.letter}/record`}
            >
              Record
            </a>
            <button
              type="button"
              className="btn main"
              disabled={selection === null || !standing.mayRaise}
              title={selection === null ? "Choose a net or a part first" : undefined}
              onClick={() => selection !== null && setAsked({ kind: "finding", selection })}
            >
              New finding
            </button>
          </>
        }
      />
      <Ruler stops={stops} selected={condition} onSelect={setCondition} />
      {view.run.state !== "done" && (
        <RunProgress run={view.run} what={`Solving Rev ${view.proposed.letter}`} />
      )}
      {view.run.state === "done" && view.comparisonRun.state !== "done" && (
        <RunProgress run={view.comparisonRun} what="Comparing with the base" />
      )}
      <main className="desk">
        <NotesColumn
          view={view}
          session={session}
          standing={standing}
          drawing={drawing}
          openFinding={openFinding}
          onOpen={setOpenFinding}
          onAsk={setAsked}
          onSelect={select}
        >
          <ItemsToCheck
            items={standing.items}
            checkedBy={standing.checkedBy}
            onCheck={
              standing.mayCheck
                ? async (item, checked) => {
                    const deed = await actions.check(item, checked).catch(() => AWAY);
                    if (!deed.done) setAsked({ kind: "refusal", message: deed.message });
                  }
                : null
            }
            onSelect={(part) => select({ part })}
          />
        </NotesColumn>
        <div className="sheetbox">
          <SheetView
            drawing={drawing}
            label={`Circuit sheet ${view.design.number} Rev ${view.proposed.letter}, condition ${condition}`}
            selection={selection}
            onSelect={select}
            openFinding={openFinding}
            onOpenFinding={setOpenFinding}
            others={session.others}
            title={titleFacts(view, standing)}
            revisions={revisionRows(view)}
            {...(standing.mySignature !== null && {
              onSign: () =>
                standing.mySignature !== null &&
                setAsked({ kind: "sign", meaning: standing.mySignature }),
            })}
          />
        </div>
        <Strip
          row={selectedNet}
          condition={condition}
          comparison={comparison}
          history={historyOf(view, selectedNet?.net ?? null, condition)}
        />
        <ReviewLedger
          view={view}
          condition={condition}
          rows={rows}
          lines={lines}
          standing={standing}
          selection={selection}
          onSelect={select}
          onAsk={setAsked}
        />
      </main>
      {asked !== null && (
        <ReviewDialogs
          asked={asked}
          view={view}
          session={session}
          actions={actions}
          condition={condition}
          onClose={() => setAsked(null)}
        />
      )}
    </>
  );
}

const AWAY: Deed = { done: false, message: "The server is away. Nothing was decided; try again." };

/** The net's voltage in the base and the proposed revision. */
function historyOf(view: ReviewView, net: string | null, condition: string) {
  if (net === null) return [];
  return [
    { letter: view.base?.letter, result: view.baseResult },
    { letter: view.proposed.letter, result: view.result },
  ].flatMap(({ letter, result }) =>
    letter === undefined || result === null
      ? []
      : [
          {
            letter,
            volts: result.conditions.find((one) => one.name === condition)?.nets[net] ?? null,
          },
        ],
  );
}
