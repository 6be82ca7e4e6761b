import type { Metadata } from "next";
import { pageMember } from "../../../lib/server/page-member";
import { SlipPage } from "../slip-page";

export const metadata: Metadata = { title: "Sign out" };

/** Signing out takes a press of a button: a link on a strange page must not do it. */
export default async function SignOutPage() {
  const member = await pageMember();
  return (
    <SlipPage title="Sign out" kind="Access">
      <h2>Signed in as {member.name}</h2>
      <p>Edits that the page calls saved are kept. Unsaved ones stay in this browser.</p>
      <form action="/api/sign-out" method="post">
        <button className="btn main" type="submit">
          Sign out
        </button>
      </form>
    </SlipPage>
  );
}
