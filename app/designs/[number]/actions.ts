"use server";

import { headers } from "next/headers";
import { z } from "zod";
import { freezeRevision } from "../../../lib/server/commands/freeze-revision";
import { actingMember } from "../../../lib/server/sign-in";
import type { FreezeDeed } from "../../draft/freeze-deed";
import { freezeRefusal } from "../../wording/freezing";
import { signedOut } from "../../wording/refusals";

const text = z.string().max(8000);

/** Freezes the stored draft. Anybody may call this with anything: it parses, then asks who acts. */
export async function freezeAction(number: string, changeNote: string): Promise<FreezeDeed> {
  const given = { number: text.parse(number), changeNote: text.parse(changeNote) };
  const member = await actingMember(await headers());
  if (!member.ok) return { done: false, message: signedOut };
  const frozen = await freezeRevision(member.value, given);
  return frozen.ok
    ? { done: true, letter: frozen.value }
    : { done: false, message: freezeRefusal(frozen.error) };
}
