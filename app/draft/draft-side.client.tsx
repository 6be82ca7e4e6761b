"use client";

import type { Projection } from "../../lib/document/projection";
import type { DraftView } from "../../lib/review/views";
import type { SheetDrawing } from "../../lib/sheet/sheet-drawing";
import type { CircuitResult } from "../../lib/stress/circuit-result";
import { formatQuantity } from "../../lib/values/format-quantity";
import type { DesignConnection } from "../collaboration/connect-design.client";
import type { PreviewAnswer } from "../preview/preview-answer";
import type { Selection } from "../sheet/selection";
import type { DraftEdits } from "./draft-edits";
import { draftProblems } from "./draft-problems";
import { Inspector } from "./inspector.client";
import { PinFields } from "./pin-fields.client";
import { useLastEdits } from "./use-last-edits.client";

/** The right side of a draft: the chosen part, what stands against the draft, and the latest edits. */
export function DraftSide(props: {
  readonly view: DraftView;
  readonly connection: DesignConnection;
  readonly projection: Projection;
  readonly answer: PreviewAnswer | null;
  readonly result: CircuitResult | null;
  readonly before: CircuitResult | null;
  readonly condition: string;
  readonly selection: Selection | null;
  readonly edits: DraftEdits;
  readonly drawing: SheetDrawing;
}) {
  const { view, projection, selection, edits, drawing, condition } = props;
  const lastEdits = useLastEdits(props.connection, projection.file, view.me, view.people);
  const problems = draftProblems(projection, props.answer);
  const ref = selection !== null && "part" in selection ? selection.part : null;
  const part = projection.file.blocks[edits.block]?.parts.find((one) => one.ref === ref);
  const drawn = drawing.parts.find((one) => one.ref === ref);
  return (
    <aside className="insp" aria-label="Chosen part, problems and edits">
      {part === undefined ? (
        <h2>
          <span>Choose a part</span>
          <span className="dim">to see and change its values</span>
        </h2>
      ) : (
        <>
          <Inspector
            part={part}
            zone={drawn?.zone ?? ""}
            disabled={!view.mayEdit}
            edits={edits.of(part.ref)}
          />
          <PinFields
            part={part}
            drawn={drawn}
            reference={projection.file.reference ?? "GND"}
            disabled={!view.mayEdit}
            edits={edits}
          />
          <PartReadings
            part={part.ref}
            condition={condition}
            result={props.result}
            before={props.before}
          />
        </>
      )}
      <h3 className="cap">Problems in this draft</h3>
      <ul className="probs">
        {problems.length === 0 && <li>None.</li>}
        {problems.slice(0, 12).map((problem) => (
          <li key={problem.words}>
            <svg width="12" height="12" viewBox="0 0 12 12" aria-hidden="true">
              {problem.weight === "fault" ? (
                <path d="M2 2L10 10M10 2L2 10" stroke="var(--red)" strokeWidth="2" fill="none" />
              ) : (
                <circle cx="6" cy="6" r="4" stroke="var(--blue)" strokeWidth="2" fill="none" />
              )}
            </svg>
            <span>{problem.words}</span>
          </li>
        ))}
        {problems.length > 12 && <li>and {problems.length - 12} more</li>}
      </ul>
      <h3 className="cap">Last edits</h3>
      <ol className="edits">
        {lastEdits.length === 0 && <li className="none">None since this page was opened.</li>}
        {lastEdits.map((edit) => (
          <li key={edit.key}>
            <span className="who">{edit.initials}</span>
            <span>{edit.words}</span>
            <span className="num">{edit.at}</span>
          </li>
        ))}
      </ol>
    </aside>
  );
}

/** Voltage, current and power of the chosen part, before the last edit and now. */
function PartReadings(props: {
  readonly part: string;
  readonly condition: string;
  readonly result: CircuitResult | null;
  readonly before: CircuitResult | null;
}) {
  const of = (result: CircuitResult | null) =>
    result?.conditions.find((one) => one.name === props.condition)?.parts[props.part] ?? null;
  const now = of(props.result);
  const was = of(props.before);
  if (now === null) return null;
  const current = (part: typeof now | null): number | null =>
    Object.values(part?.currents ?? {})[0] ?? null;
  const rows: readonly (readonly [string, number | null, number | null, string])[] = [
    ["voltage", was?.voltage ?? null, now.voltage, "V"],
    ["current", current(was), current(now), "A"],
    ["power", was?.power ?? null, now.power, "W"],
  ];
  return (
    <table className="led">
      <thead>
        <tr>
          <th>{props.condition}</th>
          <th>Before</th>
          <th>Now</th>
        </tr>
      </thead>
      <tbody>
        {rows.map(([name, before, is, unit]) => (
          <tr key={name}>
            <td>{name}</td>
            <td className="num struck">
              {before === null || is === null || Math.abs(before - is) < 1e-9
                ? ""
                : formatQuantity(before, unit)}
            </td>
            <td className="num">{is === null ? "?" : formatQuantity(is, unit)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
