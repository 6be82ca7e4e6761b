"use server";

import { headers } from "next/headers";
import { z } from "zod";
import { returnRevision } from "../../../../../lib/server/commands/return-revision";
import {
  checkItem,
  decideFinding,
  grantWaiver,
  type NotDecided,
  withdrawWaiver,
} from "../../../../../lib/server/commands/review-decisions";
import { signRevision } from "../../../../../lib/server/commands/sign-revision";
import { type ActingMember, actingMember, provePassword } from "../../../../../lib/server/sign-in";
import type { Result } from "../../../../../lib/values/result";
import type { Deed } from "../../../../dialog/deed";
import {
  decisionRefusal,
  proofRefusal,
  signedOut,
  signingSentence,
} from "../../../../wording/refusals";

/*
 * Every action may be called by anybody with any arguments: each parses what it is given and asks
 * who acts before it does anything.
 */
const about = z.object({ number: z.string().max(64), letter: z.string().max(8) });
const text = z.string().max(8000);
const subject = z.union([
  z.object({ part: text, rule: text, condition: text }),
  z.object({ limit: text, condition: text }),
]);
/** The margin that the page showed: another one is not waived. */
const margin = z.number().nullable();
/** What the page showed: a signature given to something else is refused. */
const digests = z.record(z.string(), z.string().nullable());
const meaning = z.enum(["authored", "reviewed", "approved"]);

type About = z.infer<typeof about>;

export async function checkAction(given: About, item: string, checked: boolean): Promise<Deed> {
  const where = about.parse(given);
  return decided((member) =>
    checkItem(member, where, text.parse(item), z.boolean().parse(checked)),
  );
}

export async function closeAction(given: About, finding: string, reason: string): Promise<Deed> {
  const where = about.parse(given);
  return decided((member) =>
    decideFinding(member, where, text.parse(finding), "closure", text.parse(reason)),
  );
}

export async function reopenAction(given: About, finding: string, reason: string): Promise<Deed> {
  const where = about.parse(given);
  return decided((member) =>
    decideFinding(member, where, text.parse(finding), "reopening", text.parse(reason)),
  );
}

export async function waiveAction(
  given: About,
  waived: z.infer<typeof subject>,
  shown: number | null,
  reason: string,
): Promise<Deed> {
  const where = about.parse(given);
  return decided((member) =>
    grantWaiver(member, where, subject.parse(waived), margin.parse(shown), text.parse(reason)),
  );
}

export async function withdrawAction(given: About, waiver: string, reason: string): Promise<Deed> {
  const where = about.parse(given);
  return decided((member) => withdrawWaiver(member, where, text.parse(waiver), text.parse(reason)));
}

export async function returnAction(given: About, reason: string): Promise<Deed> {
  const where = about.parse(given);
  return decided((member) => returnRevision(member, where, text.parse(reason)));
}

export async function signAction(
  given: About,
  signed: z.infer<typeof meaning>,
  password: string,
  seen: z.infer<typeof digests>,
): Promise<Deed> {
  const where = about.parse(given);
  const wanted = meaning.parse(signed);
  const member = await actingMember(await headers());
  if (!member.ok) return { done: false, message: signedOut };
  const proof = await provePassword(member.value, text.parse(password));
  if (!proof.ok) return { done: false, message: proofRefusal(proof.error) };
  const signature = await signRevision(
    member.value,
    where,
    wanted,
    proof.value,
    digests.parse(seen),
  );
  return signature.ok ? { done: true } : { done: false, message: signingSentence(signature.error) };
}

async function decided(
  decide: (member: ActingMember) => Promise<Result<unknown, NotDecided>>,
): Promise<Deed> {
  const member = await actingMember(await headers());
  if (!member.ok) return { done: false, message: signedOut };
  const decision = await decide(member.value);
  return decision.ok ? { done: true } : { done: false, message: decisionRefusal(decision.error) };
}
