import type { Page } from "@playwright/test";
import type { Role } from "../lib/review/review-state";
import { demoPeople } from "../lib/server/demo-people";

/** The demo's first person with this role. */
export function personWith(role: Role): (typeof demoPeople)[number] {
  const person = demoPeople.find(({ roles }) => roles.includes(role));
  if (person === undefined) throw new Error(`The demo has no ${role}.`);
  return person;
}

/** Fills in the sign-in form as the page stands, or goes there first. */
export async function signInAs(page: Page, role: Role, path = "/"): Promise<void> {
  const { email, password } = personWith(role);
  await page.goto(path);
  await fillIn(page, email, password);
}

export async function fillIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel("E-mail address").fill(email);
  await page.getByLabel("Password").fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
}
