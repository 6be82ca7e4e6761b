import type { ReviewView } from "../../lib/review/views";
import type { RevisionRow, SignOffLine, TitleFacts } from "../sheet/title-facts";
import { criterionWords } from "../wording/criteria";
import { dayWords } from "../wording/numbers";
import type { ReviewStanding } from "./review-standing";

const STATUS = {
  underReview: "Under review",
  released: "Released",
  returned: "Returned",
  superseded: "Superseded",
} as const;

/** The title block of a review: exit criteria, sign-off, and the fields of ISO 7200. */
export function titleFacts(view: ReviewView, standing: ReviewStanding): TitleFacts {
  const { proposed, design } = view;
  return {
    owner: design.workspace,
    title: design.title,
    documentType: "Circuit sheet",
    creator: proposed.authors.map((author) => author.name).join(", "),
    status: STATUS[proposed.state],
    number: design.number,
    revision: proposed.letter,
    dated: proposed.releasedAt === null ? "Proposed" : "Issued",
    date: dayWords(proposed.releasedAt ?? proposed.frozenAt),
    sheet: "1 / 1",
    criteria: standing.criteria.map((criterion) => ({
      words: criterionWords[criterion.id],
      verdict: criterion.verdict,
      count: criterion.of === 0 ? "none" : `${criterion.met} of ${criterion.of}`,
      ...(criterion.waived.length > 0 && { waived: [...new Set(criterion.waived)].join(", ") }),
    })),
    signOff: signOffLines(view, standing),
  };
}

function signOffLines(view: ReviewView, standing: ReviewStanding): readonly SignOffLine[] {
  return (["authored", "reviewed", "approved"] as const).map((meaning) => {
    const signature = standing.signatures.get(meaning) ?? null;
    const mine = standing.mySignature === meaning;
    return {
      meaning: meaning.charAt(0).toUpperCase() + meaning.slice(1),
      name: signature?.name ?? (mine ? view.me.name : ""),
      signedOn: signature === null ? null : dayWords(signature.at),
      waits: standing.waits.get(meaning) ?? "",
      mine,
    };
  });
}

/** The revision block: newest first. */
export function revisionRows(view: ReviewView): readonly RevisionRow[] {
  return view.design.revisions
    .toReversed()
    .slice(0, 4)
    .map((revision) => ({
      letter: revision.letter,
      change: revision.changeNote,
      date: dayWords(revision.frozenAt),
      by: revision.authors.map((author) => author.initials).join(" "),
    }));
}
