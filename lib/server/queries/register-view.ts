import { database } from "../../database/client";
import { topLevel } from "../../document/shape";
import { conditionMargins, leastMargin } from "../../review/condition-margins";
import { allMet } from "../../review/exit-criteria";
import { standingClosures } from "../../review/finding-states";
import { limitSubject } from "../../review/limit-words";
import type { RegisterRow, RegisterView, RevisionView, WaitingCard } from "../../review/views";
import { grantedWaivers, waiverOfLimit, waiverOfRow } from "../../review/waivers";
import { storedDocument } from "../document-state";
import { type ReviewOf, reviewOf, revisionsOf } from "../review-of";
import type { ActingMember } from "../sign-in";
import { memberView } from "./design-view";
import { waitingFor } from "./waiting-for";

/** The drawing register of the member's workspace: every design, by number, and what waits for the member. */
export async function registerView(member: ActingMember): Promise<RegisterView> {
  const [workspace, designs] = await Promise.all([
    database().workspace.findUniqueOrThrow({
      where: { id: member.workspace },
      select: { name: true },
    }),
    database().design.findMany({
      where: { workspaceId: member.workspace },
      orderBy: { createdAt: "asc" },
      select: { id: true, number: true, title: true },
    }),
  ]);
  const rows = await Promise.all(designs.map((design) => rowOf(member, design)));
  return {
    me: memberView(member),
    workspace: workspace.name,
    waiting: rows.flatMap(({ card }) => (card === null ? [] : [card])),
    rows: rows.map(({ row }) => row),
    asOf: new Date().toISOString().slice(0, 10),
  };
}

async function rowOf(
  member: ActingMember,
  design: { readonly id: string; readonly number: string; readonly title: string },
): Promise<{ readonly row: RegisterRow; readonly card: WaitingCard | null }> {
  const revisions = await revisionsOf(design.id);
  const latest = revisions.at(-1);
  const read = latest === undefined ? null : await reviewOf(member, design.number, latest.letter);
  const review = read?.ok === true ? read.value : null;
  const waits = review === null ? null : waitingFor(member, review);
  const row: RegisterRow = {
    number: design.number,
    title: design.title,
    sheetSize: review === null ? await draftSize(design.id) : sheetSize(review),
    revisions: revisions.map(({ letter, state }) => ({ letter, state: revisionState(state) })),
    state: review === null ? "Draft, never issued" : stateWords(review),
    waitsFor: waits?.for ?? null,
    waitsForMe: waits?.mine ?? false,
    leastMargin: review === null ? null : leastOf(review),
    href:
      latest === undefined
        ? `/designs/${design.number}`
        : `/designs/${design.number}/reviews/${latest.letter}`,
  };
  return { row, card: waits?.card ?? null };
}

function revisionState(state: string): RevisionView["state"] {
  return state === "released" || state === "returned" || state === "superseded"
    ? state
    : "underReview";
}

/** `Under review, 2 majors open`, `Solving, condition 3 of 5`, `Released`. */
function stateWords(review: ReviewOf): string {
  const { revision, run } = review;
  if (run?.state === "queued" || run === null) return "Waits for the worker";
  if (run.state === "running")
    return `Solving, condition ${Math.min(run.done + 1, run.of)} of ${run.of}`;
  if (run.state === "failed") return "Could not be solved";
  if (revision.state === "released") return "Released";
  if (revision.state === "returned") return "Returned to its authors";
  const closures = standingClosures(review.decisions);
  const majors = review.findings.filter(
    (finding) => finding.severity === "major" && !closures.has(finding.id),
  ).length;
  if (majors > 0) return `Under review, ${majors} ${majors === 1 ? "major" : "majors"} open`;
  if (allMet(review.criteria)) return "Under review, all criteria met";
  const open = review.criteria.filter((criterion) => criterion.verdict !== "pass").length;
  return `Under review, ${open} ${open === 1 ? "criterion" : "criteria"} open`;
}

function leastOf(review: ReviewOf): RegisterRow["leastMargin"] {
  const { result } = review;
  if (result === null) return null;
  const waivers = grantedWaivers(review.decisions);
  const margins = result.conditions
    .flatMap((condition) =>
      conditionMargins(result, condition.name, (subject) =>
        "limit" in subject
          ? result.limits.some(
              (row) =>
                row.condition === subject.condition &&
                limitSubject(row) === subject.limit &&
                waiverOfLimit(row, waivers) !== null,
            )
          : result.stress.some(
              (row) =>
                row.condition === subject.condition &&
                row.part === subject.part &&
                row.rule.id === subject.rule &&
                waiverOfRow(row, waivers) !== null,
            ),
      ),
    )
    .toSorted((a, b) => a.margin - b.margin);
  const least = leastMargin(margins);
  if (least === null) return null;
  return {
    margin: least.margin,
    part: "limit" in least.subject ? least.subject.limit : least.subject.part,
    waived: least.waived,
  };
}

function sheetSize(review: ReviewOf): string {
  const top = review.file.top ?? Object.keys(review.file.blocks)[0] ?? "";
  return review.file.blocks[top]?.sheet?.size ?? "A3";
}

async function draftSize(design: string): Promise<string> {
  const doc = await storedDocument(design);
  const sizes = [...(doc === null ? [] : topLevel(doc, "blocks").values())].flatMap((block) =>
    typeof block === "object" && block !== null && "size" in block ? [String(block.size)] : [],
  );
  doc?.destroy();
  return sizes[0] ?? "A3";
}
