import * as Y from "yjs";
import { readSide } from "../../comparison/read-side";
import { writeCircuitFile } from "../../document/from-circuit-file";
import { freshId } from "../../document/shape";
import type { FileProblem } from "../../values/problem";
import { fail, ok, type Result } from "../../values/result";
import { appendAudit, inTransaction } from "../decide";
import type { ActingMember } from "../sign-in";

export type NoDesign =
  | { readonly kind: "notADesigner" }
  | { readonly kind: "numberTaken"; readonly number: string }
  | { readonly kind: "badNumber" }
  | { readonly kind: "badFile"; readonly problems: readonly FileProblem[] };

/** As on a drawing: capitals, figures and hyphens, 16 characters at most (ISO 7200). */
const NUMBER = /^[A-Z0-9][A-Z0-9-]{0,15}$/;

/** Makes a design from a circuit file: its shared document is written once, here. @returns the design's id */
export async function createDesign(
  member: ActingMember,
  given: {
    readonly number: string;
    readonly title: string;
    readonly file: string;
    readonly at?: string;
  },
): Promise<Result<string, NoDesign>> {
  if (!member.roles.includes("designer")) return fail({ kind: "notADesigner" });
  if (!NUMBER.test(given.number)) return fail({ kind: "badNumber" });
  const read = readSide(given.file);
  if (!read.ok) return fail({ kind: "badFile", problems: read.error });
  const title = given.title === "" ? (read.value.file.title ?? given.number) : given.title;
  const doc = new Y.Doc();
  writeCircuitFile(doc, { ...read.value.file, title }, freshId);
  const bytes = new Uint8Array(Y.encodeStateAsUpdate(doc));
  doc.destroy();
  return inTransaction(async (transaction) => {
    // The workspace first, as the audit log does: two who make designs at once take turns.
    await transaction.$queryRaw`
      select id from "Workspace" where id = ${member.workspace} for no key update`;
    const where = { workspaceId: member.workspace, number: given.number };
    if ((await transaction.design.findUnique({ where: { workspaceId_number: where } })) !== null)
      return fail({ kind: "numberTaken", number: given.number });
    const design = await transaction.design.create({ data: { ...where, title } });
    await transaction.documentUpdate.create({
      data: { designId: design.id, bytes, author: null },
    });
    await appendAudit(transaction, member.workspace, {
      at: given.at ?? new Date().toISOString(),
      actor: member.user,
      action: "design created",
      subject: design.id,
      payload: { number: given.number, title },
    });
    return ok(design.id);
  });
}
