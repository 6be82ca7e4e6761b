import { database } from "../../database/client";
import type { RunView } from "../../review/views";
import { fail, ok, type Result } from "../../values/result";
import type { NotFound } from "../commands/design-of";
import { runOf } from "../review-of";
import type { ActingMember } from "../sign-in";
import { runView } from "./design-view";

/** How far a run of one of the member's own workspace's revisions is. */
export async function runProgress(
  member: ActingMember,
  address: string,
): Promise<Result<RunView, NotFound>> {
  const own = await database().revision.findFirst({
    where: {
      OR: [{ runAddress: address }, { comparisonAddress: address }],
      design: { workspaceId: member.workspace },
    },
    select: { id: true },
  });
  if (own === null) return fail({ kind: "notFound" });
  return ok(runView(address, await runOf(address)));
}
