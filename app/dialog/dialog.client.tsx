"use client";

import { type ReactNode, useEffect, useId, useRef } from "react";

/** A question laid over the page: the browser's own modal dialog, so focus and Escape are its own. */
export function Dialog(props: {
  readonly title: string;
  readonly onClose: () => void;
  readonly children: ReactNode;
}) {
  const box = useRef<HTMLDialogElement>(null);
  const title = useId();
  useEffect(() => {
    box.current?.showModal();
  }, []);
  return (
    <dialog ref={box} className="ask" aria-labelledby={title} onClose={props.onClose}>
      <h2 id={title}>{props.title}</h2>
      {props.children}
    </dialog>
  );
}
