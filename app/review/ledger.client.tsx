"use client";

import { type ReactNode, useId } from "react";

export type LedgerPane = "nets" | "stress" | "causes" | "limits";

export interface LedgerTab {
  readonly pane: LedgerPane;
  readonly words: string;
  /** How many stand out; shown beside the word. */
  readonly count: number;
  readonly bad: boolean;
}

/** The ledger beside the sheet: four panes behind tabs that the arrow keys walk. */
export function Ledger(props: {
  readonly tabs: readonly LedgerTab[];
  readonly selected: LedgerPane;
  readonly onSelect: (pane: LedgerPane) => void;
  readonly children: ReactNode;
  readonly foot: ReactNode;
}) {
  const id = useId();
  const walk = (step: 1 | -1): void => {
    const at = props.tabs.findIndex((tab) => tab.pane === props.selected);
    const next = props.tabs[(at + step + props.tabs.length) % props.tabs.length];
    if (next === undefined) return;
    props.onSelect(next.pane);
    document.getElementById(`${id}-${next.pane}`)?.focus();
  };
  return (
    <section className="ledger" aria-label="Ledger">
      <div className="tabs" role="tablist" aria-label="Ledger panes">
        {props.tabs.map((tab) => (
          <button
            type="button"
            role="tab"
            key={tab.pane}
            id={`${id}-${tab.pane}`}
            aria-selected={tab.pane === props.selected}
            aria-controls={`${id}-pane`}
            tabIndex={tab.pane === props.selected ? 0 : -1}
            onClick={() => props.onSelect(tab.pane)}
            onKeyDown={(event) => {
              if (event.key === "ArrowRight") walk(1);
              if (event.key === "ArrowLeft") walk(-1);
            }}
          >
            {tab.words}
            <i className={tab.bad && tab.count > 0 ? "bad" : ""}>{tab.count}</i>
          </button>
        ))}
      </div>
      <div
        className="pane"
        role="tabpanel"
        id={`${id}-pane`}
        aria-labelledby={`${id}-${props.selected}`}
        data-pane={props.selected}
      >
        <div className="panescroll">{props.children}</div>
        {props.foot}
      </div>
    </section>
  );
}
