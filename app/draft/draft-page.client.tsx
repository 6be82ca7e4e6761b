"use client";

import type { DraftView } from "../../lib/review/views";
import { useDesign } from "../collaboration/use-design.client";
import { Mast } from "../mast/mast";
import { DraftBoard } from "./draft-board.client";
import type { FreezeDeed } from "./freeze-deed";

/** The draft of a design: drawn together, solved as it changes. */
export function DraftPage(props: {
  readonly view: DraftView;
  readonly freeze: (changeNote: string) => Promise<FreezeDeed>;
}) {
  const { view } = props;
  const connection = useDesign(view.design.id, view.me.id);
  if (connection === null)
    return (
      <>
        <Mast number={view.design.number} title={view.design.title} subtitle="Draft" />
        <main className="opening" aria-live="polite">
          <p>Opening the draft …</p>
        </main>
      </>
    );
  return <DraftBoard view={view} connection={connection} freeze={props.freeze} />;
}
