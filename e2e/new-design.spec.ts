import { readFile } from "node:fs/promises";
import { expect, test } from "@playwright/test";
import { signInAs } from "./sign-in";

test("a circuit file is brought in, drawn and solved; a bad one says every problem with its place", async ({
  page,
}) => {
  await signInAs(page, "designer", "/");
  await page.getByRole("link", { name: "New design" }).click();
  await page.getByLabel("Number, as on the drawing").fill("DIV-1");
  await page.getByLabel("Title").fill("Divider");
  const upload = page.getByLabel(/Circuit file/);
  const bad = {
    ampersign: 1,
    blocks: { main: { parts: [{ ref: "R1", kind: "resistr" }] } },
    limit: [],
  };
  await upload.setInputFiles({
    name: "bad.json",
    mimeType: "application/json",
    buffer: Buffer.from(JSON.stringify(bad)),
  });
  await page.getByRole("button", { name: "Make design" }).click();
  const said = page.getByRole("alert").filter({ hasText: "nothing was brought in" });
  await expect(said).toContainText("/limit");
  await expect(said).toContainText("/blocks/main/parts/0");
  const examples: readonly { id: string; circuit: unknown }[] = JSON.parse(
    await readFile("tests/kept/examples.json", "utf8"),
  );
  const circuit = examples.find(({ id }) => id.startsWith("dc-"))?.circuit;
  await upload.setInputFiles({
    name: "good.json",
    mimeType: "application/json",
    buffer: Buffer.from(JSON.stringify(circuit)),
  });
  await page.getByRole("button", { name: "Make design" }).click();
  await expect(page.getByText("Draft, never issued")).toBeVisible();
  await expect(page.getByText(/Solved in \d+ ms/)).toBeVisible();
  await page.goto("/");
  await expect(page.getByRole("link", { name: "DIV-1" })).toBeVisible();
});

test("an empty sheet begins with nothing, and a part, named nets and a value give a voltage", async ({
  page,
}) => {
  await signInAs(page, "designer", "/designs/new");
  await page.getByLabel("Number, as on the drawing").fill("NEW-1");
  await page.getByLabel("Title").fill("From nothing");
  await page.getByRole("button", { name: "Make design" }).click();
  await page.getByRole("button", { name: "Place a voltage" }).click();
  await page.getByRole("button", { name: /^V1\b/ }).first().focus();
  await page.keyboard.press("Enter");
  for (const [pin, net] of [
    ["Pin plus", "OUT"],
    ["Pin minus", "GND"],
  ] as const) {
    await page.getByLabel(pin, { exact: true }).fill(net);
    await page.getByLabel(pin, { exact: true }).press("Enter");
  }
  await page.getByLabel("DC value").fill("5 V");
  await page.getByLabel("DC value").press("Enter");
  await expect(page.getByLabel("Pin plus", { exact: true })).toHaveText("OUT");
  await expect(page.getByText("5.000 V").first()).toBeVisible();
});
