"use client";

import type { Cause, Comparison } from "../../lib/comparison/comparison";
import { shiftWords } from "../wording/numbers";
import { editWords } from "./edit-words";

/** The Causes pane of the ledger: for each loud shift, the fair share of every edit. */
export function CausesPane(props: { readonly comparison: Comparison; readonly condition: string }) {
  const { comparison, condition } = props;
  const groups = causeGroups(comparison.causes, condition);
  const words = new Map(comparison.edits.map((edit) => [edit.id, editWords(edit)]));
  if (groups.length === 0) {
    return <p className="none">No loud shift in this condition, so there is nothing to explain.</p>;
  }
  return (
    <>
      <svg className="sr" aria-hidden="true">
        <defs>
          <pattern
            id="hatch-ink"
            width="4"
            height="4"
            patternUnits="userSpaceOnUse"
            patternTransform="rotate(45)"
          >
            <path d="M0 0V4" stroke="var(--ink)" strokeWidth="1.6" />
          </pattern>
        </defs>
      </svg>
      <ul className="causes">
        {groups.map((group) => (
          <CauseGroup key={group.subject} group={group} words={words} />
        ))}
      </ul>
      {comparison.problems.map((problem) => (
        <p className="none" key={problem.message}>
          {problem.message}
        </p>
      ))}
    </>
  );
}

interface CauseGroupView {
  readonly subject: string;
  readonly unit: string;
  readonly shares: readonly Cause[];
  readonly whole: number;
}

function CauseGroup(props: {
  readonly group: CauseGroupView;
  readonly words: ReadonlyMap<string, string>;
}) {
  const { group, words } = props;
  const size = group.shares.reduce((sum, cause) => sum + Math.abs(cause.share), 0) || 1;
  let start = 0;
  return (
    <li>
      <div className="top">
        <b>{group.subject}</b>
        <span className="num">
          {group.unit === "%"
            ? `${shiftWords(group.whole * 100)} %`
            : `${shiftWords(group.whole)} ${group.unit}`}
        </span>
      </div>
      <svg aria-hidden="true">
        {group.shares.map((cause, index) => {
          const width = (Math.abs(cause.share) / size) * 99;
          const x = start;
          start += width;
          return width < 0.4 ? null : (
            <rect
              key={cause.edit}
              className={`sg k${index % 3}`}
              x={`${x + 0.3}%`}
              y="1"
              width={`${width}%`}
              height="11"
            />
          );
        })}
      </svg>
      <p>
        {group.shares.map((cause) => (
          <span className="nb" key={cause.edit}>
            {words.get(cause.edit) ?? cause.edit}{" "}
            <b>{shiftWords(group.unit === "%" ? cause.share * 100 : cause.share)}</b>{" "}
          </span>
        ))}
      </p>
    </li>
  );
}

function causeGroups(causes: readonly Cause[], condition: string): readonly CauseGroupView[] {
  const groups = new Map<string, Cause[]>();
  for (const cause of causes) {
    if (cause.condition !== condition) continue;
    const subject = cause.net ?? `${cause.part ?? "?"} margin, ${cause.rule ?? ""}`;
    groups.set(subject, [...(groups.get(subject) ?? []), cause]);
  }
  return [...groups]
    .map(([subject, shares]) => ({
      subject,
      unit: shares[0]?.net === undefined ? "%" : "V",
      shares: shares.toSorted((a, b) => Math.abs(b.share) - Math.abs(a.share)),
      whole: shares.reduce((sum, cause) => sum + cause.share, 0),
    }))
    .sort((a, b) => Math.abs(b.whole) - Math.abs(a.whole));
}
