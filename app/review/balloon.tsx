import type { Severity } from "../../lib/review/review-state";

/** A finding's balloon: hexagon major, circle minor, square observation, diamond question. */
export function Balloon(props: { readonly severity: Severity; readonly number: number }) {
  return (
    <svg className="balloon" viewBox="-12 -12 24 24" aria-hidden="true">
      <Outline severity={props.severity} />
      <text y="4">{props.number}</text>
    </svg>
  );
}

function Outline(props: { readonly severity: Severity }) {
  switch (props.severity) {
    case "major":
      return <path className="o" d="M-5.06 -9.2H5.06L10.12 0L5.06 9.2H-5.06L-10.12 0Z" />;
    case "minor":
      return <circle className="o" cx="0" cy="0" r="9.2" />;
    case "observation":
      return <rect className="o q" x="-8.46" y="-8.46" width="16.92" height="16.92" />;
    case "question":
      return <path className="o q" d="M0 -11.04L11.04 0L0 11.04L-11.04 0Z" />;
  }
}
