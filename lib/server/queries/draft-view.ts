import type { DraftView } from "../../review/views";
import { ok, type Result } from "../../values/result";
import { nextRevisionLetter } from "../../values/revision-letter";
import { designOf, type NotFound } from "../commands/design-of";
import { peopleOf, revisionsOf } from "../review-of";
import type { ActingMember } from "../sign-in";
import { designView, memberView, personView } from "./design-view";

/** The live draft of a design, for its page; its content comes through the shared document. */
export async function draftView(
  member: ActingMember,
  number: string,
): Promise<Result<DraftView, NotFound>> {
  const design = await designOf(member, number);
  if (!design.ok) return design;
  const [revisions, people] = await Promise.all([
    revisionsOf(design.value.id),
    peopleOf(member.workspace),
  ]);
  return ok({
    design: await designView(design.value, revisions, people),
    me: memberView(member),
    people: people.map(personView),
    nextLetter: nextRevisionLetter(revisions.at(-1)?.letter ?? null),
    mayEdit: member.roles.includes("designer"),
  });
}
