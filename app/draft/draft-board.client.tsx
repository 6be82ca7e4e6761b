"use client";

import { useEffect, useMemo, useState } from "react";
import { conditionMargins } from "../../lib/review/condition-margins";
import type { DraftView } from "../../lib/review/views";
import { drawSheet } from "../../lib/sheet/layout";
import type { DesignConnection } from "../collaboration/connect-design.client";
import { useProjection, useSaveState } from "../collaboration/use-design.client";
import { useShownPresence } from "../collaboration/use-shown-presence.client";
import { Mast } from "../mast/mast";
import { Presence } from "../mast/presence";
import { SaveMark } from "../mast/save-mark";
import { usePreview } from "../preview/use-preview.client";
import { Ruler } from "../review/ruler.client";
import { settingWords } from "../review/setting-words";
import type { Selection } from "../sheet/selection";
import { SheetView } from "../sheet/sheet-view.client";
import { ConditionStrip } from "./condition-strip.client";
import { draftEdits } from "./draft-edits";
import { draftFacts, draftTitle } from "./draft-facts";
import { DraftSide } from "./draft-side.client";
import { DraftStateLine } from "./draft-state-line";
import type { FreezeDeed } from "./freeze-deed";
import { FreezeDialog } from "./freeze-dialog.client";
import { PartsDrawer } from "./parts-drawer.client";
import { RefusedCopy } from "./refused-copy.client";
import { useLastResult } from "./use-last-result.client";
import { useUndoKeys } from "./use-undo-keys.client";

/** Where a part goes that is placed from the drawer by a press: the clear middle of the sheet. */
const FIRST_PLACE = [450, 330] as const;

/** The open draft: drawer, sheet, what the preview says, and the chosen part's values. */
export function DraftBoard(props: {
  readonly view: DraftView;
  readonly connection: DesignConnection;
  readonly freeze: (changeNote: string) => Promise<FreezeDeed>;
}) {
  const { connection } = props;
  const save = useSaveState(connection);
  const isReadOnly = connection.isReadOnly();
  const view = useMemo(
    () => (isReadOnly ? { ...props.view, mayEdit: false } : props.view),
    [props.view, isReadOnly],
  );
  const refusedCopy = save.kind === "refused" ? (connection.refused()?.copy ?? null) : null;
  const projection = useProjection(connection.doc);
  const { file } = projection;
  const preview = usePreview(file);
  const { result, before } = useLastResult(preview.answer);
  const presence = useShownPresence(connection, view.me, view.people);
  const names = (file.conditions ?? [{ name: "Nominal" }]).map((one) => one.name);
  const [wanted, setCondition] = useState<string | null>(null);
  const condition = wanted !== null && names.includes(wanted) ? wanted : (names[0] ?? "Nominal");
  const [selection, setSelection] = useState<Selection | null>(null);
  const [drawer, setDrawer] = useState(false);
  const [freezing, setFreezing] = useState(false);
  const edits = useMemo(() => draftEdits(connection.doc, projection), [connection, projection]);
  const drawing = useMemo(
    () => drawSheet(file, draftFacts(view, result, before, condition)),
    [file, view, result, before, condition],
  );
  const undo = useUndoKeys(connection.undo, view.mayEdit);
  const { show } = presence;
  useEffect(() => show(selection), [show, selection]);

  const stops = names.map((name) => ({
    name,
    setting: settingWords(file, name),
    solved: result?.conditions.find((one) => one.name === name)?.status === "solved",
    margins: result === null ? [] : conditionMargins(result, name, () => false),
  }));
  const net = selection !== null && "net" in selection ? selection.net : null;
  return (
    <>
      <Mast
        number={view.design.number}
        title={view.design.title}
        subtitle={draftSubtitle(view)}
        cells={
          <>
            <SaveMark state={save} />
            <Presence people={presence.people} />
          </>
        }
        actions={
          <>
            {refusedCopy !== null && <RefusedCopy copy={refusedCopy} number={view.design.number} />}
            <button
              type="button"
              className="btn"
              data-drawer=""
              aria-expanded={drawer}
              onClick={() => setDrawer((open) => !open)}
            >
              Parts
            </button>
            <button type="button" className="btn" disabled={!undo.mayUndo} onClick={undo.undo}>
              Undo
            </button>
            <button type="button" className="btn" disabled={!undo.mayRedo} onClick={undo.redo}>
              Redo
            </button>
            <button
              type="button"
              className="btn main"
              disabled={!view.mayEdit}
              onClick={() => setFreezing(true)}
            >
              Freeze Rev {view.nextLetter} …
            </button>
          </>
        }
      />
      <Ruler stops={stops} selected={condition} onSelect={setCondition} slim />
      <main className="board">
        <PartsDrawer
          open={drawer}
          disabled={!view.mayEdit}
          onPlace={(kind) => edits.place(kind, FIRST_PLACE)}
        />
        <div className="mid">
          <div className="sheetbox">
            <SheetView
              drawing={drawing}
              label={`Draft sheet ${view.design.number}, condition ${condition}`}
              selection={selection}
              onSelect={setSelection}
              others={presence.others}
              title={draftTitle(view)}
              {...(view.mayEdit && { editing: edits.onSheet })}
            />
          </div>
          {net !== null && result !== null && (
            <ConditionStrip net={net} result={result} before={before} />
          )}
        </div>
        <DraftSide
          view={view}
          connection={connection}
          projection={projection}
          answer={preview.answer}
          before={before}
          result={result}
          condition={condition}
          selection={selection}
          edits={edits}
          drawing={drawing}
        />
      </main>
      <DraftStateLine answer={preview.answer} stale={preview.stale} condition={condition} />
      {freezing && (
        <FreezeDialog
          view={view}
          save={save}
          freeze={props.freeze}
          onClose={() => setFreezing(false)}
        />
      )}
    </>
  );
}

function draftSubtitle(view: DraftView): string {
  const last = view.design.revisions.at(-1);
  const after = last === undefined ? "Draft, never issued" : `Draft after Rev ${last.letter}`;
  return view.mayEdit ? after : `${after}, read only`;
}
