import { database } from "../../database/client";
import type { DesignView, PersonView, RevisionView, RunView } from "../../review/views";
import type { DesignRow } from "../commands/design-of";
import type { revisionsOf, runOf, WorkspacePerson } from "../review-of";
import type { ActingMember } from "../sign-in";

type RevisionRow = Awaited<ReturnType<typeof revisionsOf>>[number];
type RunRow = Awaited<ReturnType<typeof runOf>>;

/** A person as pages show them. */
export function personView(person: WorkspacePerson): PersonView {
  const words = person.name.split(" ").filter((word) => word !== "");
  const initials = [words[0], words.length > 1 ? words.at(-1) : undefined]
    .map((word) => word?.charAt(0).toUpperCase() ?? "")
    .join("");
  return { id: person.id, name: person.name, initials, roles: person.roles };
}

export function memberView(member: ActingMember): PersonView {
  return personView({ id: member.user, name: member.name, roles: member.roles });
}

export function revisionView(
  revision: RevisionRow,
  people: readonly WorkspacePerson[],
): RevisionView {
  const unknown = (id: string): WorkspacePerson => ({ id, name: "Somebody", roles: [] });
  return {
    letter: revision.letter,
    digest: revision.digest,
    changeNote: revision.changeNote,
    frozenAt: revision.frozenAt.toISOString(),
    authors: revision.authors.map((id) =>
      personView(people.find((person) => person.id === id) ?? unknown(id)),
    ),
    state: stateOf(revision.state),
    releasedAt: revision.releasedAt?.toISOString() ?? null,
  };
}

export async function designView(
  design: DesignRow,
  revisions: readonly RevisionRow[],
  people: readonly WorkspacePerson[],
): Promise<DesignView> {
  const workspace = await database().workspace.findUniqueOrThrow({
    where: { id: design.workspaceId },
    select: { name: true },
  });
  return {
    id: design.id,
    number: design.number,
    title: design.title,
    workspace: workspace.name,
    documentPath: `/doc/${design.id}`,
    revisions: revisions.map((revision) => revisionView(revision, people)),
  };
}

/** A run as pages show it; one that was never asked for waits. */
export function runView(address: string, run: RunRow): RunView {
  return {
    address,
    state: runState(run?.state),
    done: run?.done ?? 0,
    of: run?.of ?? 0,
    at: run?.at ?? null,
    failure: run?.failure ?? null,
  };
}

function stateOf(state: string): RevisionView["state"] {
  if (state === "released" || state === "returned" || state === "superseded") return state;
  return "underReview";
}

function runState(state: string | undefined): RunView["state"] {
  if (state === "running" || state === "done" || state === "failed") return state;
  return "queued";
}
