import type { CircuitFile } from "../circuit/circuit-file";
import type { Edit } from "./comparison";

/** An edit that can be made on the base alone: what causes are computed with. */
export interface FileEdit {
  readonly edit: Edit;
  /** The file with this edit made. Edits touch different places, so they can be made in any order. */
  readonly apply: (file: CircuitFile) => CircuitFile;
  /** Whether it can move a voltage. */
  readonly electrical: boolean;
  /** Whether it can move a margin while every voltage stays: a rating, a style, the policy. */
  readonly judging: boolean;
}
