import { changedItems } from "../../review/changed-items";
import { latestChecks } from "../../review/checks";
import { allMet } from "../../review/exit-criteria";
import { standingClosures } from "../../review/finding-states";
import { type Meaning, maySign } from "../../review/signing";
import type { RegisterRow, WaitingCard } from "../../review/views";
import { type ReviewOf, standingSignatures, type WorkspacePerson } from "../review-of";
import type { ActingMember } from "../sign-in";

export interface Waiting {
  readonly for: RegisterRow["waitsFor"];
  readonly mine: boolean;
  readonly card: WaitingCard | null;
}

/** Whom a review waits for now, and the card for one it waits for. */
export function waitingFor(member: ActingMember, review: ReviewOf): Waiting {
  const { revision } = review;
  if (revision.state !== "underReview") return { for: null, mine: false, card: null };
  if (review.result === null || review.comparison === null)
    return { for: { name: "the worker", to: "to solve it" }, mine: false, card: null };
  const meaning = nextSignature(review);
  const me = { id: member.user, roles: member.roles };
  const mine = meaning !== null && mayTake(me, meaning, review);
  const person = mine
    ? me
    : (review.people.find((one) => meaning !== null && mayTake(one, meaning, review)) ?? null);
  const name = person === null ? null : nameOf(review.people, person.id);
  return {
    for: name === null || meaning === null ? null : { name, to: TO_DO[meaning] },
    mine,
    card: mine && meaning !== null ? cardOf(review, meaning) : null,
  };
}

const TO_DO: Readonly<Record<Meaning, string>> = {
  authored: "to submit",
  reviewed: "to review",
  approved: "to approve",
};
const GO_ON: Readonly<Record<Meaning, string>> = {
  authored: "Look and submit",
  reviewed: "Go on reviewing",
  approved: "Look and approve",
};

/** The first signature that is not given yet. */
function nextSignature(review: ReviewOf): Meaning | null {
  const signed = new Set(standingSignatures(review).map((signature) => signature.meaning));
  const meanings: readonly Meaning[] = ["authored", "reviewed", "approved"];
  return meanings.find((meaning) => !signed.has(meaning)) ?? null;
}

/** Whether a signature is this person's to give, be it that criteria still stand open. */
function mayTake(
  person: Pick<WorkspacePerson, "id" | "roles">,
  meaning: Meaning,
  review: ReviewOf,
): boolean {
  const may = maySign(meaning, person, {
    underReview: true,
    authors: review.revision.authors,
    criteria: review.criteria,
    signatures: standingSignatures(review),
  });
  return may.ok || may.error.kind === "criteriaOpen";
}

function cardOf(review: ReviewOf, meaning: Meaning): WaitingCard {
  const { design, revision, base } = review;
  const against = base === null ? "first issue" : `against Rev ${base.letter}`;
  return {
    heading: `${design.number} Rev ${revision.letter} ${against}`,
    text: cardText(review),
    why: meaning === "authored" ? "Author" : meaning === "reviewed" ? "Reviewer" : "Approver",
    action: GO_ON[meaning],
    href: `/designs/${design.number}/reviews/${revision.letter}`,
  };
}

function cardText(review: ReviewOf): string {
  if (allMet(review.criteria)) return "All exit criteria are met.";
  const items = review.comparison === null ? [] : changedItems(review.comparison);
  const checks = latestChecks(review.decisions, review.revision.letter);
  const unchecked = items.filter((item) => !checks.has(item.id)).length;
  const closures = standingClosures(review.decisions);
  const open = review.findings.filter((finding) => !closures.has(finding.id)).length;
  const failing = review.criteria.find((criterion) => criterion.id === "stress")?.open[0];
  const words = [
    ...(unchecked > 0
      ? [`${unchecked} changed ${unchecked === 1 ? "item" : "items"} nobody has checked`]
      : []),
    ...(open > 0 ? [`${open} open ${open === 1 ? "finding" : "findings"}`] : []),
    ...(failing === undefined ? [] : [`over its derated limit: ${failing}`]),
  ];
  return words.length === 0 ? "Some exit criteria stand open." : `${words.join("; ")}.`;
}

function nameOf(people: readonly WorkspacePerson[], id: string): string | null {
  return people.find((person) => person.id === id)?.name ?? null;
}
