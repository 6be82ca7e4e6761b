import { expect, test } from "@playwright/test";
import { fillIn, personWith, signInAs } from "./sign-in";

const SESSION = "ampersign.session_token";

test("the reviewer signs in and sees the drawing register", async ({ page }) => {
  await signInAs(page, "reviewer");
  await expect(page.getByRole("heading", { name: "Drawing register" })).toBeVisible();
  await expect(page.getByRole("link", { name: "FFC-2" })).toBeVisible();
  await expect(page.getByText("Orchard frost-fan controller")).toBeVisible();
});

test("a wrong password is said, opens nothing, and gives nobody away", async ({ page }) => {
  await page.goto("/");
  const { email, password } = personWith("reviewer");
  await fillIn(page, email, `${password}!`);
  const said = await page.getByRole("alert").filter({ hasText: "password" }).textContent();
  expect(await page.context().cookies()).not.toContainEqual(
    expect.objectContaining({ name: SESSION }),
  );
  await fillIn(page, "nobody@hollow-lane.example", password);
  await expect(page.getByRole("alert").filter({ hasText: "password" })).toHaveText(said ?? "");
  await page.goto("/");
  await expect(page).toHaveURL(/\/sign-in/);
});

test("an ended session leads to the sign-in page and back to where one was", async ({
  page,
  baseURL,
}) => {
  await page
    .context()
    .addCookies([{ name: SESSION, value: "long-gone.signature", url: baseURL ?? "" }]);
  await page.goto("/sign-out");
  await expect(page.getByText("Your session has ended")).toBeVisible();
  await page.goto("/sign-in?next=//elsewhere.example/trap");
  const { email, password } = personWith("reviewer");
  await fillIn(page, email, password);
  await expect(page).toHaveURL(`${baseURL}/`);
});

test("who signs out is out, with the old cookie too", async ({ page }) => {
  await signInAs(page, "reviewer");
  await expect(page.getByRole("heading", { name: "Drawing register" })).toBeVisible();
  const kept = (await page.context().cookies()).filter(({ name }) => name === SESSION);
  expect(kept).toHaveLength(1);
  await page.goto("/sign-out");
  await page.getByRole("button", { name: "Sign out" }).click();
  await expect(page.getByText("You are signed out.")).toBeVisible();
  await page.context().addCookies(kept);
  await page.goto("/");
  await expect(page).toHaveURL(/\/sign-in/);
});

test("what does not exist is a page of ours with 404", async ({ page }) => {
  await signInAs(page, "reviewer");
  const answer = await page.goto("/no/such/sheet");
  expect(answer?.status()).toBe(404);
  await expect(page.getByRole("heading", { name: "There is nothing here for you" })).toBeVisible();
});

test("pages take nothing from elsewhere and break no rule of their own", async ({ page }) => {
  const foreign: string[] = [];
  const complaints: string[] = [];
  page.on("request", (request) => foreign.push(new URL(request.url()).hostname));
  page.on("console", (message) => {
    if (message.type() === "error") complaints.push(message.text());
  });
  await page.goto("/sign-in");
  await page.getByRole("button", { name: "Blueprint" }).click();
  await expect(page.locator("html")).toHaveAttribute("data-theme", "blueprint");
  await page.reload();
  await expect(page.locator("html")).toHaveAttribute("data-theme", "blueprint");
  expect(new Set(foreign)).toEqual(new Set(["127.0.0.1"]));
  expect(complaints).toEqual([]);
});

test("a form from elsewhere signs nobody in", async ({ request }) => {
  const { email, password } = personWith("reviewer");
  const answer = await request.post("/api/sign-in", {
    form: { email, password },
    headers: { origin: "http://elsewhere.example" },
    maxRedirects: 0,
  });
  expect(answer.status()).toBe(403);
  expect(answer.headers()["set-cookie"]).toBeUndefined();
});
