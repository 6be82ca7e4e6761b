import { sealedRecord } from "../../../../../../../lib/server/queries/sealed-record";
import { recordPdf } from "../../../../../../../lib/server/record-pdf";
import { actingMember } from "../../../../../../../lib/server/sign-in";
import { recordOutline } from "../../../../../../record/outline";
import { cautions } from "../../../../../../wording/cautions";

/** The record printed: the same outline as the page's. */
export async function GET(
  request: Request,
  context: { readonly params: Promise<{ readonly number: string; readonly letter: string }> },
): Promise<Response> {
  const member = await actingMember(request.headers);
  if (!member.ok) return new Response(null, { status: 404 });
  const { number, letter } = await context.params;
  const sealed = await sealedRecord(member.value, number, letter, cautions);
  if (!sealed.ok) return new Response(null, { status: 404 });
  const { design, revision } = sealed.value.record;
  const pdf = await recordPdf(recordOutline(sealed.value));
  return new Response(Buffer.from(pdf), {
    headers: {
      "content-type": "application/pdf",
      "content-disposition": `attachment; filename="${design.number}-${revision.letter}.record.pdf"`,
      "cache-control": "no-store",
    },
  });
}
