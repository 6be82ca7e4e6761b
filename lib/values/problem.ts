/** A fault of a circuit file. `at` is a JSON Pointer (RFC 6901), or "line L, column C" of text that is not JSON. */
export interface FileProblem {
  readonly code: FileProblemCode;
  /** One sentence for a person: what is wrong, and what to do. */
  readonly message: string;
  readonly at: string;
}

/** Every way a circuit file can be bad; the codes are public. */
export type FileProblemCode =
  | "notJson"
  | "unknownKey"
  | "missingKey"
  | "wrongType"
  | "badValue"
  | "wrongUnit"
  | "outOfRange"
  | "unknownKind"
  | "unknownPin"
  | "missingPin"
  | "duplicateRef"
  | "duplicateName"
  | "duplicateKey"
  | "noSuchPart"
  | "noSuchParam"
  | "noSuchNet"
  | "noSuchBlock"
  | "blockContainsItself"
  | "tooLarge"
  | "unreadable";
