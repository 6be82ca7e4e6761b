import type { WaiverSubject } from "../../lib/review/review-state";
import type { Deed } from "../dialog/deed";
import type { Meaning } from "./sign-dialog.client";

/** The decisions a review page asks the server for; handed down as props, since pages may not reach the server layer from the browser. */
export interface ReviewActions {
  readonly check: (item: string, checked: boolean) => Promise<Deed>;
  readonly close: (finding: string, reason: string) => Promise<Deed>;
  readonly reopen: (finding: string, reason: string) => Promise<Deed>;
  readonly waive: (subject: WaiverSubject, margin: number | null, reason: string) => Promise<Deed>;
  readonly withdraw: (waiver: string, reason: string) => Promise<Deed>;
  readonly sign: (
    meaning: Meaning,
    password: string,
    seen: Readonly<Record<string, string | null>>,
  ) => Promise<Deed>;
  readonly giveBack: (reason: string) => Promise<Deed>;
}
