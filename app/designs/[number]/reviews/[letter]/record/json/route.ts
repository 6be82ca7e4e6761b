import { sealedRecord } from "../../../../../../../lib/server/queries/sealed-record";
import { actingMember } from "../../../../../../../lib/server/sign-in";
import { cautions } from "../../../../../../wording/cautions";

/** The sealed record as a file that `verify` reads. */
export async function GET(
  request: Request,
  context: { readonly params: Promise<{ readonly number: string; readonly letter: string }> },
): Promise<Response> {
  const member = await actingMember(request.headers);
  if (!member.ok) return new Response(null, { status: 404 });
  const { number, letter } = await context.params;
  const sealed = await sealedRecord(member.value, number, letter, cautions);
  if (!sealed.ok) return new Response(null, { status: 404 });
  const name = `${sealed.value.record.design.number}-${sealed.value.record.revision.letter}.record.json`;
  return new Response(JSON.stringify(sealed.value), {
    headers: {
      "content-type": "application/json",
      "content-disposition": `attachment; filename="${name}"`,
      "cache-control": "no-store",
    },
  });
}
