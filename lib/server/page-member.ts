import { headers } from "next/headers";
import { notFound, redirect } from "next/navigation";
import { ownPath } from "./own-path";
import { type ActingMember, actingMember, carriesSession } from "./sign-in";

/**
 * The member who looks at a page. Nobody signed in: on to the sign-in page, which leads back here. Signed in, but in no
 * workspace: the page does not exist.
 */
export async function pageMember(): Promise<ActingMember> {
  const given = await headers();
  const member = await actingMember(given);
  if (member.ok) return member.value;
  if (member.error === "notAMember") notFound();
  const query = new URLSearchParams();
  const back = ownPath(given.get("x-ampersign-path"));
  if (back !== "/") query.set("next", back);
  if (carriesSession(given)) query.set("problem", "expired");
  redirect(query.size === 0 ? "/sign-in" : `/sign-in?${query}`);
}
