import type { MayNotSign } from "../../lib/review/signing";

const DONE = { authored: "author", reviewed: "review", approved: "approval" } as const;

/** What a signature's place says while it cannot be given: short, for the title block. */
export function waitsWords(why: MayNotSign): string {
  switch (why.kind) {
    case "alreadySigned":
      return "";
    case "waitsFor":
      return `after ${DONE[why.meaning]}`;
    case "criteriaOpen":
      return `${why.open.length} open`;
    case "notUnderReview":
      return "closed";
    case "notAnAuthor":
      return "by an author";
    case "notAReviewer":
      return "by a reviewer";
    case "notAnApprover":
      return "by an approver";
    case "authorOfIt":
      return "by another";
  }
}

/** The same as a sentence for the person who tried. */
export function signingRefusal(why: MayNotSign): string {
  switch (why.kind) {
    case "alreadySigned":
      return `${why.by} has signed here already.`;
    case "waitsFor":
      return `This signature comes after the one for ${why.meaning}. Ask for that first.`;
    case "criteriaOpen":
      return `Not every exit criterion is met: ${why.open.slice(0, 3).join("; ")}${why.open.length > 3 ? ` and ${why.open.length - 3} more` : ""}.`;
    case "notUnderReview":
      return "This revision is not under review any longer.";
    case "notAnAuthor":
      return "Only an author of this revision signs as author.";
    case "notAReviewer":
      return "Signing as reviewer takes the reviewer's role in this workspace.";
    case "notAnApprover":
      return "Signing as approver takes the approver's role in this workspace.";
    case "authorOfIt":
      return "An author may neither review nor approve the own revision: ask a colleague.";
  }
}
