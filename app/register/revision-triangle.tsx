import type { RevisionView } from "../../lib/review/views";

const STATES: Readonly<
  Record<RevisionView["state"], { readonly className: string; readonly words: string }>
> = {
  released: { className: "rt rel", words: "released" },
  superseded: { className: "rt rel", words: "released, superseded" },
  underReview: { className: "rt open", words: "under review" },
  returned: { className: "rt ret", words: "returned" },
};

/** A revision's triangle: filled when released, dashed under review, crossed when returned. */
export function RevisionTriangle(props: {
  readonly letter: string;
  readonly state: RevisionView["state"];
}) {
  const { className, words } = STATES[props.state];
  return (
    <svg
      className={className}
      viewBox="0 0 24 22"
      role="img"
      aria-label={`Rev ${props.letter}: ${words}`}
    >
      <path d="M12 2L22.5 20.5H1.5Z" />
      {props.state === "returned" && <path d="M3 21.5L21 2.5" />}
      <text x="12" y="18">
        {props.letter}
      </text>
    </svg>
  );
}
