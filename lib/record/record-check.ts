/** One thing that was checked of a record, and what was found. */
export interface RecordCheck {
  readonly check:
    | "digest"
    | "signature"
    | "circuits"
    | "bound"
    | "signatures"
    | "audit"
    | "results"
    | "comparison";
  readonly holds: boolean;
  /** One sentence. */
  readonly message: string;
}

export function held(check: RecordCheck["check"], message: string): RecordCheck {
  return { check, holds: true, message };
}

export function broken(check: RecordCheck["check"], message: string): RecordCheck {
  return { check, holds: false, message };
}
