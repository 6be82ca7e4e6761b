"use client";

import { useRouter } from "next/navigation";
import type { DraftView } from "../../lib/review/views";
import { ReasonDialog } from "../dialog/reason-dialog.client";
import type { SaveState } from "../wording/save-words";
import type { FreezeDeed } from "./freeze-deed";

/** Freezing the draft as a revision: the change note, then on to the review. */
export function FreezeDialog(props: {
  readonly view: DraftView;
  readonly save: SaveState;
  readonly freeze: (changeNote: string) => Promise<FreezeDeed>;
  readonly onClose: () => void;
}) {
  const { view, save } = props;
  const router = useRouter();
  return (
    <ReasonDialog
      title={`Freeze Rev ${view.nextLetter}`}
      explanation={`The draft as it is stored becomes Rev ${view.nextLetter} and never changes again. The worker solves it, and a review against the last released revision begins.${save.kind === "saved" ? "" : " Your last edits are not stored yet: wait until the page says saved."}`}
      label="Change note: what changed, and why"
      action={`Freeze Rev ${view.nextLetter}`}
      onDo={async (note) => {
        const deed = await props.freeze(note);
        if (!deed.done) return deed;
        router.push(`/designs/${view.design.number}/reviews/${deed.letter}`);
        return { done: true };
      }}
      onClose={props.onClose}
    />
  );
}
