import { runProgress } from "../../../../lib/server/queries/run-progress";
import { actingMember } from "../../../../lib/server/sign-in";

/** How far a run is; nobody else's can be asked for. */
export async function GET(
  request: Request,
  context: { readonly params: Promise<{ readonly address: string }> },
): Promise<Response> {
  const member = await actingMember(request.headers);
  if (!member.ok) return new Response(null, { status: 404 });
  const { address } = await context.params;
  const run = await runProgress(member.value, decodeURIComponent(address));
  return run.ok ? Response.json(run.value) : new Response(null, { status: 404 });
}
