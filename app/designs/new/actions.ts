"use server";

import { headers } from "next/headers";
import { z } from "zod";
import { createDesign } from "../../../lib/server/commands/create-design";
import { actingMember } from "../../../lib/server/sign-in";
import { newDesignRefusal } from "../../wording/new-design";
import { signedOut } from "../../wording/refusals";
import type { NewDesignDeed } from "./new-design-deed";

/** As large as a circuit file may be on the way in; the reader's own caps come after. */
const MOST_CHARACTERS = 8_000_000;

const given = z.object({
  number: z.string().max(64),
  title: z.string().max(200),
  file: z.string().max(MOST_CHARACTERS),
});

/** Makes a design. Anybody may call this with anything: it parses, then asks who acts. */
export async function createDesignAction(wanted: z.infer<typeof given>): Promise<NewDesignDeed> {
  const parsed = given.safeParse(wanted);
  if (!parsed.success)
    return { done: false, message: "The file is too large to be brought in.", problems: [] };
  const member = await actingMember(await headers());
  if (!member.ok) return { done: false, message: signedOut, problems: [] };
  const design = await createDesign(member.value, parsed.data);
  if (design.ok) return { done: true, number: parsed.data.number };
  return {
    done: false,
    message: newDesignRefusal(design.error),
    problems: design.error.kind === "badFile" ? design.error.problems : [],
  };
}
