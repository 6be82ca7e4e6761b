const YEAR_S = 31_536_000;

/** Keeps the choice of paper or blueprint, so that the server draws it from the first byte. */
export async function POST(request: Request): Promise<Response> {
  const wanted = await request.text();
  if (wanted !== "paper" && wanted !== "blueprint") return new Response(null, { status: 400 });
  return new Response(null, {
    status: 204,
    headers: { "set-cookie": `theme=${wanted}; Path=/; Max-Age=${YEAR_S}; SameSite=Lax; HttpOnly` },
  });
}
