import type { Metadata } from "next";
import { pageMember } from "../lib/server/page-member";
import { registerView } from "../lib/server/queries/register-view";
import { Mast } from "./mast/mast";
import { SignedIn } from "./mast/signed-in";
import { Register } from "./register/register";

export const metadata: Metadata = { title: "Drawing register" };

export default async function RegisterPage() {
  const member = await pageMember();
  const view = await registerView(member);
  return (
    <>
      <Mast
        title={view.workspace}
        subtitle="Drawing register"
        cells={<SignedIn me={view.me} />}
        actions={
          view.me.roles.includes("designer") && (
            <a className="btn main" href="/designs/new">
              New design
            </a>
          )
        }
      />
      <Register view={view} />
    </>
  );
}
