import type { Metadata } from "next";
import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { ownPath } from "../../../lib/server/own-path";
import { actingMember } from "../../../lib/server/sign-in";
import { isFailure, signInSentence } from "../../wording/sign-in";
import { SlipPage } from "../slip-page";

export const metadata: Metadata = { title: "Sign in" };

/** Asks who one is, and leads back to where one wanted to go. */
export default async function SignInPage(props: {
  readonly searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>>;
}) {
  const query = await props.searchParams;
  const next = ownPath(only(query["next"]));
  const problem = only(query["problem"]);
  const member = await actingMember(await headers());
  if (member.ok) redirect(next);
  const sentence = signInSentence(problem);
  return (
    <SlipPage title="Sign in" kind="Access">
      <h2>Who are you?</h2>
      {sentence !== null && (
        <p
          className={isFailure(problem) ? "notice failure" : "notice"}
          role={isFailure(problem) ? "alert" : "status"}
        >
          {sentence}
        </p>
      )}
      <form action="/api/sign-in" method="post">
        <label>
          <span className="cap">E-mail address</span>
          <input name="email" type="email" autoComplete="username" required />
        </label>
        <label>
          <span className="cap">Password</span>
          <input name="password" type="password" autoComplete="current-password" required />
        </label>
        <input name="next" type="hidden" value={next} />
        <button className="btn main" type="submit">
          Sign in
        </button>
      </form>
    </SlipPage>
  );
}

function only(value: string | string[] | undefined): string | undefined {
  return typeof value === "string" ? value : undefined;
}
