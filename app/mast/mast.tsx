import type { ReactNode } from "react";
import { ThemeSwitch } from "./theme-switch.client";

/** The one bar above every page: the mark, the drawing at hand, then what the page puts in. */
export function Mast(props: {
  readonly number?: string;
  readonly title: string;
  readonly subtitle?: string;
  /** Cells between the drawing's name and the buttons: state, people. */
  readonly cells?: ReactNode;
  readonly actions?: ReactNode;
}) {
  return (
    <header className="mast">
      <a className="mark" href="/">
        <svg viewBox="0 0 20 20" aria-hidden="true">
          <path d="M2 17L10 3L18 17" fill="none" stroke="currentColor" strokeWidth="2" />
          <path d="M5 12H15" stroke="currentColor" strokeWidth="2" />
          <circle cx="10" cy="3" r="2.2" fill="currentColor" />
        </svg>
        Ampersign
      </a>
      <div className="drawing">
        {props.number !== undefined && <b className="num">{props.number}</b>}
        <h1>{props.title}</h1>
        {props.subtitle !== undefined && <span>{props.subtitle}</span>}
      </div>
      {props.cells}
      <div>
        <ThemeSwitch />
        {props.actions}
      </div>
    </header>
  );
}
