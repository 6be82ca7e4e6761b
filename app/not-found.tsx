import type { Metadata } from "next";
import { SlipPage } from "./(sign-in)/slip-page";

export const metadata: Metadata = { title: "Not in this register" };

/** The same answer for what does not exist and for what one may not see. */
export default function NotFound() {
  return (
    <SlipPage title="Not in this register" kind="Notice">
      <h2>There is nothing here for you</h2>
      <p>
        The address is mistyped, or it belongs to a workspace that you are not a member of. Ask
        whoever gave it to you to look at it again.
      </p>
      <a className="btn main" href="/">
        To the drawing register
      </a>
    </SlipPage>
  );
}
