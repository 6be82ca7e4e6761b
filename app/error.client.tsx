"use client";

import { SlipPage } from "./(sign-in)/slip-page";

/** What a defect of ours looks like to a person: no stack, no guess, a way on. */
export default function ErrorPage(props: {
  readonly error: Error & { readonly digest?: string };
  readonly reset: () => void;
}) {
  const { digest } = props.error;
  return (
    <SlipPage title="This page failed" kind="Notice">
      <h2>This page failed, through no fault of yours</h2>
      <p>
        Nothing that was called saved is lost. Try again; if it fails again, tell whoever runs this
        server{digest === undefined ? "." : ` the number ${digest}, under which the log has it.`}
      </p>
      <button className="btn main" type="button" onClick={props.reset}>
        Try again
      </button>
    </SlipPage>
  );
}
