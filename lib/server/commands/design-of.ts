import { database, type TransactionClient } from "../../database/client";
import { fail, ok, type Result } from "../../values/result";
import type { ActingMember } from "../sign-in";

/** There is no such thing in the member's workspace; of another workspace's the answer is the same. */
export interface NotFound {
  readonly kind: "notFound";
}

export interface DesignRow {
  readonly id: string;
  readonly number: string;
  readonly title: string;
  readonly workspaceId: string;
}

/** A design of the member's own workspace, by its number. */
export async function designOf(
  member: ActingMember,
  number: string,
  client: TransactionClient = database(),
): Promise<Result<DesignRow, NotFound>> {
  const design = await client.design.findUnique({
    where: { workspaceId_number: { workspaceId: member.workspace, number } },
    select: { id: true, number: true, title: true, workspaceId: true },
  });
  return design === null ? fail({ kind: "notFound" }) : ok(design);
}

/** The same, locked until the transaction ends: whoever decides about a design takes turns. */
export async function lockedDesignOf(
  transaction: TransactionClient,
  member: ActingMember,
  number: string,
): Promise<Result<DesignRow, NotFound>> {
  await transaction.$queryRaw`
    select id from "Design" where "workspaceId" = ${member.workspace} and number = ${number}
    for no key update`;
  return designOf(member, number, transaction);
}
