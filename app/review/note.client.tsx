"use client";

import type { Finding } from "../../lib/review/review-state";
import { momentWords } from "../wording/numbers";
import { Balloon } from "./balloon";
import { RemarkForm } from "./remark-form.client";

/** What a note shows of its finding besides the words: numbers and standing, computed by the page. */
export interface NoteFacts {
  readonly zone: string;
  readonly anchor: string;
  /** The number it was written about, and what it is now; null where it is about no number. */
  readonly was: string | null;
  readonly is: string | null;
  readonly isPast: boolean;
  readonly backInside: boolean;
  readonly closed: { readonly by: string; readonly reason: string } | null;
  readonly mayClose: boolean;
  readonly mayReopen: boolean;
}

/** A finding as a slip beside the sheet; the chosen one opens to its remarks and what may be done. */
export function Note(props: {
  readonly finding: Finding;
  readonly facts: NoteFacts;
  readonly on: boolean;
  readonly nameOf: (user: string) => string;
  readonly onSelect: () => void;
  readonly onRemark: ((text: string) => void) | null;
  readonly onClose: () => void;
  readonly onReopen: () => void;
}) {
  const { finding, facts, on, nameOf } = props;
  return (
    <article
      className={on ? "note on" : "note"}
      data-sev={finding.severity}
      data-f={finding.number}
    >
      <header>
        <Balloon severity={finding.severity} number={finding.number} />
        <span className="sev">
          {facts.closed === null ? finding.severity : `${finding.severity}, closed`}
        </span>
        <span className="zone">{facts.zone}</span>
      </header>
      <button type="button" className="pick body" aria-expanded={on} onClick={props.onSelect}>
        <span className="sr">
          Finding {finding.number} at {facts.anchor}:{" "}
        </span>
        {finding.text}
      </button>
      <div className="wasis">
        {facts.was !== null && <span className="num struck">{facts.was}</span>}
        {facts.is !== null && (
          <span className={facts.isPast ? "num worse" : "num"}>{facts.is}</span>
        )}
        {facts.backInside && <span>back inside</span>}
        <span className="by">{nameOf(finding.author)}</span>
      </div>
      {on && (
        <div className="talk">
          <p className="by">
            {facts.anchor}, Rev {finding.revision}, {momentWords(finding.at)}
          </p>
          <ul>
            {finding.remarks.map((remark) => (
              <li key={remark.id}>
                <b>{nameOf(remark.author)}</b> {remark.text}
                <span className="by">{momentWords(remark.at)}</span>
              </li>
            ))}
          </ul>
          {facts.closed !== null && (
            <p>
              <b>Closed by {facts.closed.by}:</b> {facts.closed.reason}
            </p>
          )}
          {props.onRemark !== null && <RemarkForm onRemark={props.onRemark} />}
          <div className="acts">
            {facts.mayClose && (
              <button type="button" className="btn" onClick={props.onClose}>
                Close finding …
              </button>
            )}
            {facts.mayReopen && (
              <button type="button" className="btn" onClick={props.onReopen}>
                Reopen …
              </button>
            )}
          </div>
        </div>
      )}
    </article>
  );
}
