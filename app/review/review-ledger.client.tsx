"use client";

import { useState } from "react";
import type { ReviewView } from "../../lib/review/views";
import type { Selection } from "../sheet/selection";
import { CausesPane } from "./causes-pane.client";
import { Ledger, type LedgerPane } from "./ledger.client";
import { LedgerFoot } from "./ledger-foot";
import { LimitsPane } from "./limits-pane.client";
import type { NetRow } from "./net-rows";
import { NetsPane } from "./nets-pane.client";
import type { Asked } from "./review-dialogs.client";
import type { ReviewStanding } from "./review-standing";
import { limitsPast } from "./sheet-facts-of-review";
import type { StressLine } from "./stress-lines";
import { StressPane } from "./stress-pane.client";

/** The ledger of a review: nets, stress, causes and limits of the condition at hand. */
export function ReviewLedger(props: {
  readonly view: ReviewView;
  readonly condition: string;
  readonly rows: readonly NetRow[];
  readonly lines: readonly StressLine[];
  readonly standing: ReviewStanding;
  readonly selection: Selection | null;
  readonly onSelect: (selection: Selection) => void;
  readonly onAsk: (asked: Asked) => void;
}) {
  const { view, condition, rows, lines, standing, selection, onSelect, onAsk } = props;
  const [pane, setPane] = useState<LedgerPane>("nets");
  const { result, comparison } = view;
  const over = lines.filter((line) => line.row.verdict !== "pass" && line.waiver === null).length;
  const mayWaive = view.me.roles.includes("approver") && standing.open;
  const letters = { baseLetter: view.base?.letter ?? null, letter: view.proposed.letter };
  return (
    <Ledger
      tabs={[
        { pane: "nets", words: "Nets", count: rows.filter((row) => row.loud).length, bad: true },
        { pane: "stress", words: "Stress", count: over, bad: true },
        { pane: "causes", words: "Causes", count: comparison?.edits.length ?? 0, bad: false },
        { pane: "limits", words: "Limits", count: limitsPast(view), bad: true },
      ]}
      selected={pane}
      onSelect={setPane}
      foot={
        <LedgerFoot
          condition={result?.conditions.find((one) => one.name === condition) ?? null}
          engine={result?.engine ?? ""}
          policy={view.proposedFile.policy?.use ?? "common-practice"}
        />
      }
    >
      {pane === "nets" && (
        <NetsPane rows={rows} {...letters} selection={selection} onSelect={onSelect} />
      )}
      {pane === "stress" && (
        <StressPane
          lines={lines}
          {...letters}
          selection={selection}
          onSelect={onSelect}
          onWaive={mayWaive ? (line) => onAsk({ kind: "waive", row: line.row }) : undefined}
        />
      )}
      {pane === "causes" && comparison !== null && (
        <CausesPane comparison={comparison} condition={condition} />
      )}
      {pane === "limits" && result !== null && (
        <LimitsPane
          result={result}
          base={view.baseResult}
          {...letters}
          waiverOf={standing.waiverOfLimit}
          onWaive={mayWaive ? (row) => onAsk({ kind: "waiveLimit", row }) : undefined}
        />
      )}
    </Ledger>
  );
}
