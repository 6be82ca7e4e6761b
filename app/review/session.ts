import type { Anchor, Decision, Finding, Severity, Was } from "../../lib/review/review-state";
import type { PresentPerson } from "../mast/presence";
import type { Selection } from "../sheet/selection";
import type { Presence } from "../sheet/sheet-props";
import type { SaveState } from "../wording/save-words";

/** What the shared document gives a review page live, and what the page may write into it: words, never decisions. */
export interface ReviewSession {
  readonly findings: readonly Finding[];
  readonly decisions: readonly Decision[];
  readonly people: readonly PresentPerson[];
  readonly others: readonly Presence[];
  readonly save: SaveState;
  readonly raise: (finding: {
    readonly anchor: Anchor;
    readonly severity: Severity;
    readonly text: string;
    readonly was: Was | null;
    readonly revision: string;
  }) => void;
  readonly remark: (finding: string, text: string) => void;
  readonly show: (selection: Selection | null) => void;
}
