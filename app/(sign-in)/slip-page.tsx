import type { ReactNode } from "react";
import { Mast } from "../mast/mast";
import "./slip-page.css";

/** A page with one thing to say or to ask: a slip on the empty board, with its title block. */
export function SlipPage(props: {
  readonly title: string;
  readonly kind: string;
  readonly children: ReactNode;
}) {
  return (
    <>
      <Mast title={props.title} />
      <main className="slip-page">
        <section className="sheetbox">
          <div className="slip-text">{props.children}</div>
          <dl className="rtitle">
            <div>
              <dt>Document type</dt>
              <dd>{props.kind}</dd>
            </div>
            <div>
              <dt>Title</dt>
              <dd className="t">{props.title}</dd>
            </div>
          </dl>
        </section>
      </main>
    </>
  );
}
