"use client";

import type { ConditionMargin } from "../../lib/review/condition-margins";
import { leastMargin } from "../../lib/review/condition-margins";
import { marginWords } from "../wording/numbers";
import { quantityName } from "../wording/quantities";

export interface RulerStop {
  readonly name: string;
  readonly setting: string;
  readonly solved: boolean;
  readonly margins: readonly ConditionMargin[];
}

/** Percent of the stop's width: 0 at 14.3, +50 % at 42.9, +100 % at 71.4. */
const position = (margin: number): string =>
  `${Math.min(Math.max(14.3 + margin * 57.1, 1), 99).toFixed(1)}%`;

/** The condition ruler: a stop for each operating condition, a graduation for each margin in it. */
export function Ruler(props: {
  readonly stops: readonly RulerStop[];
  readonly selected: string;
  readonly onSelect: (condition: string) => void;
  readonly slim?: boolean;
}) {
  const worst = worstStop(props.stops);
  return (
    <nav
      className={props.slim ? "ruler slim" : "ruler"}
      style={{ gridTemplateColumns: `repeat(${props.stops.length}, minmax(0, 1fr))` }}
      aria-label="Condition ruler: each graduation is one margin; left of the broken line is over"
    >
      {props.stops.map((stop) => (
        <button
          type="button"
          className="stop"
          key={stop.name}
          aria-pressed={stop.name === props.selected}
          onClick={() => props.onSelect(stop.name)}
        >
          <b>{stop.name}</b>
          <Least stop={stop} worst={stop.name === worst} />
          {!props.slim && <Rug margins={stop.margins} />}
        </button>
      ))}
    </nav>
  );
}

function Least(props: { readonly stop: RulerStop; readonly worst: boolean }) {
  const least = leastMargin(props.stop.margins);
  const bad = least !== null && least.margin < 0 && !least.waived;
  return (
    <>
      <span className={bad ? "m bad" : "m"}>
        {props.worst && bad && (
          <svg className="flag" viewBox="0 0 11 13" aria-hidden="true">
            <path
              d="M1.5 0V13M2 1H10L7.5 4L10 7H2"
              fill="currentColor"
              stroke="currentColor"
              strokeWidth="1.4"
            />
          </svg>
        )}
        {least === null
          ? props.stop.solved
            ? "no margin"
            : "not solved"
          : marginWords(least.margin)}
      </span>
      <span className="set">{props.stop.setting}</span>
      <span className="of">
        {least === null ? "" : `${props.worst && bad ? "worst: " : ""}${subjectWords(least)}`}
      </span>
    </>
  );
}

function Rug(props: { readonly margins: readonly ConditionMargin[] }) {
  return (
    <svg className="rug" aria-hidden="true">
      <line className="base" x1="0" x2="100%" y1="19" y2="19" />
      <line className="zero" x1="14.3%" x2="14.3%" y1="0" y2="22" />
      <text x="14.3%" y="29.5" textAnchor="middle">
        0
      </text>
      <text x="42.9%" y="29.5" textAnchor="middle">
        +50
      </text>
      <text x="71.4%" y="29.5" textAnchor="middle">
        +100 %
      </text>
      {props.margins
        .filter((entry) => entry.margin <= 1.5)
        .map((entry) => {
          const over = entry.margin < 0 && !entry.waived;
          const x = position(entry.margin);
          return (
            <line
              key={JSON.stringify(entry.subject)}
              className={over ? "over" : ""}
              x1={x}
              x2={x}
              y1={over ? 1 : entry.margin < 0.2 ? 6 : 10}
              y2={19}
            />
          );
        })}
    </svg>
  );
}

/** Whose margin it is: `Q1 junction temperature`, `limit TREF`. */
function subjectWords(entry: ConditionMargin): string {
  if ("limit" in entry.subject) return `limit ${entry.subject.limit}`;
  const words = `${entry.subject.part} ${shortQuantity(entry.subject.quantity)}`;
  return entry.waived ? `${words}, waived` : words;
}

/** A stop is narrow: the commonest long names are cut to their first word. */
function shortQuantity(quantity: string): string {
  return quantity === "junctionTemperature" ? "junction" : quantityName(quantity);
}

function worstStop(stops: readonly RulerStop[]): string | null {
  let worst: { name: string; margin: number } | null = null;
  for (const stop of stops) {
    const least = leastMargin(stop.margins);
    if (least === null || least.waived) continue;
    if (worst === null || least.margin < worst.margin) {
      worst = { name: stop.name, margin: least.margin };
    }
  }
  return worst?.name ?? null;
}
