import { execFile } from "node:child_process";
import { readFile, writeFile } from "node:fs/promises";
import { promisify } from "node:util";
import { type Browser, expect, type Page, test } from "@playwright/test";
import { demoPeople } from "../lib/server/demo-people";
import { fillIn } from "./sign-in";

const run = promisify(execFile);

/** A page of one of the demo's people, in a browser of their own. */
async function pageOf(browser: Browser, firstName: string, path: string): Promise<Page> {
  const person = demoPeople.find(({ name }) => name.startsWith(firstName));
  if (person === undefined) throw new Error(`The demo has no ${firstName}.`);
  const page = await (await browser.newContext()).newPage();
  await page.goto(path);
  await fillIn(page, person.email, person.password);
  return page;
}

function passwordOf(firstName: string): string {
  return demoPeople.find(({ name }) => name.startsWith(firstName))?.password ?? "";
}

async function sign(page: Page, firstName: string, meaning: string): Promise<void> {
  await page.getByRole("button", { name: `Sign: ${meaning}` }).click();
  await page.getByLabel("Your password, again").fill(passwordOf(firstName));
  await page.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(page.getByRole("dialog")).toBeHidden();
}

const ledger = (page: Page) => page.getByRole("region", { name: "Ledger" });
const notes = (page: Page) => page.getByRole("complementary", { name: "Findings" });
const stop = (page: Page, name: string) =>
  page.getByRole("navigation", { name: /Condition ruler/ }).getByRole("button", { name });

test("from a doubtful revision to a record that anyone can verify", async ({
  browser,
}, testInfo) => {
  test.setTimeout(240_000);

  // 1. The reviewer finds Rev C in the register and opens it against Rev B.
  const idris = await pageOf(browser, "Idris", "/");
  const row = idris.getByRole("row").filter({ hasText: "FFC-2" });
  await expect(row.getByRole("img", { name: "Rev A: released, superseded" })).toBeVisible();
  await expect(row.getByRole("img", { name: "Rev B: released", exact: true })).toBeVisible();
  await expect(row.getByRole("img", { name: "Rev C: under review" })).toBeVisible();
  await row.getByRole("link", { name: "FFC-2" }).click();
  await expect(idris.getByText("Rev C against Rev B")).toBeVisible();

  // 2. Numbers from the worker's run, each beside its certificate.
  await stop(idris, "Hot and charging").click();
  const tref = ledger(idris).getByRole("row").filter({ hasText: "TREF" });
  await expect(tref).toContainText("5.734");
  await expect(tref).toContainText("6.021");
  await expect(tref).toContainText("+0.287");
  await expect(ledger(idris)).toContainText(
    /Certificate, Hot and charging: Kirchhoff residual \d\.\de-1\d/,
  );
  await ledger(idris)
    .getByRole("tab", { name: /Stress/ })
    .click();
  const junction = ledger(idris)
    .getByRole("row")
    .filter({ hasText: "Q1" })
    .filter({ hasText: "junction temperature" });
  await expect(junction).toContainText("−2.6");
  await junction.getByRole("button", { name: "Q1" }).click();
  await expect(ledger(idris)).toContainText("cp-transistor-junction");
  await ledger(idris).getByRole("tab", { name: /Nets/ }).click();

  // 3. A finding at the node; the designer sees it at once in another browser, and answers.
  const mara = await pageOf(browser, "Mara", "/designs/FFC-2/reviews/C");
  await expect(mara.getByText("Rev C against Rev B")).toBeVisible();
  await expect(idris.getByText("Mara Holt is here")).toBeAttached();
  await expect(mara.getByText("Idris Bello is here")).toBeAttached();
  await tref.getByRole("button", { name: "TREF" }).click();
  await expect(idris.getByRole("region", { name: "Selected net" })).toContainText("R7 30k to 33k");
  await idris.getByRole("button", { name: "New finding" }).click();
  await expect(idris.getByRole("dialog")).toContainText("6.021 V");
  await idris
    .getByLabel("What is wrong, and why it matters")
    .fill("The fan now starts too late: blossom is lost below 1 °C.");
  await idris.getByRole("button", { name: "Raise finding" }).click();
  await expect(idris.getByText("Saved", { exact: true })).toBeVisible();
  await notes(mara)
    .getByRole("button", { name: /Finding 1 at net TREF/ })
    .click();
  await mara.getByLabel("Remark").fill("Seen. R7 goes to 31k6 and the coil back to 400 Ω.");
  await mara.getByRole("button", { name: "Add remark" }).click();
  await notes(idris)
    .getByRole("button", { name: /Finding 1 at net TREF/ })
    .click();
  await expect(notes(idris)).toContainText("R7 goes to 31k6");
  await notes(idris).getByRole("checkbox", { name: "R7 30k to 33k" }).check();
  await expect(notes(mara)).toContainText("Changed items: 1 of 5 checked");

  // 4. The draft: edited by one, seen live by another, its voltages following; then frozen.
  await mara.goto("/designs/FFC-2");
  const jonas = await pageOf(browser, "Jonas", "/designs/FFC-2");
  for (const page of [mara, jonas]) await expect(page.getByText(/Solved in \d+ ms/)).toBeVisible();
  await changeValue(mara, "R7", "Resistance", "31k6");
  await expect(jonas.getByRole("list").filter({ hasText: "R7 33k to 31k6" })).toBeVisible();
  await changeValue(mara, "K1", "Resistance", "400 Ω");
  await changeValue(mara, "K1", "Inductance", "0.6 H");
  await expect(problems(mara)).not.toContainText("Q1 junction");
  await expect(problems(jonas)).not.toContainText("TREF");
  await mara.getByRole("button", { name: "Place a capacitor" }).click();
  await expect(jonas.getByText("C3 added")).toBeVisible();
  await mara.getByRole("button", { name: "Undo" }).click();
  await expect(jonas.getByText("C3 removed")).toBeVisible();
  await expect(mara.getByText("Saved", { exact: true })).toBeVisible();
  await mara.getByRole("button", { name: "Freeze Rev D …" }).click();
  await mara.getByLabel(/Change note/).fill("Trip point and coil as in B; gate resistor 4k7 stays");
  await mara.getByRole("button", { name: "Freeze Rev D", exact: true }).click();
  await expect(mara.getByText("Rev D against Rev B")).toBeVisible();
  await expect(ledger(mara)).toContainText("Certificate, Nominal: Kirchhoff residual");
  await expect(notes(mara)).toContainText("Changed items: 0 of 3 checked");

  // 5. Criteria are computed: the approver cannot sign before they hold.
  const tove = await pageOf(browser, "Tove", "/designs/FFC-2/reviews/D");
  await expect(tove.getByText("Rev D against Rev B")).toBeVisible();
  await expect(tove.getByRole("button", { name: /^Sign:/ })).toHaveCount(0);
  await sign(mara, "Mara", "authored");
  await idris.goto("/designs/FFC-2/reviews/D");
  await expect(notes(idris)).toContainText("back inside");
  for (const item of ["R7 30k to 31k6", "R9 10k to 4k7", "C3 removed"])
    await notes(idris).getByRole("checkbox", { name: item }).check();
  await notes(idris)
    .getByRole("button", { name: /Finding 1 at net TREF/ })
    .click();
  await notes(idris).getByRole("button", { name: "Close finding …" }).click();
  await idris.getByLabel("Disposition").fill("Mended in Rev D; measured number is back inside.");
  await idris.getByRole("button", { name: "Close finding", exact: true }).click();
  await expect(idris.getByRole("dialog")).toBeHidden();
  await expect(notes(idris)).toContainText("major, closed");
  await sign(idris, "Idris", "reviewed");
  const approve = tove.getByRole("button", { name: "Sign: approved" });
  await approve.click();
  await tove.getByLabel("Your password, again").fill("not the password");
  await tove.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(tove.getByRole("alert").filter({ hasText: "Nothing was signed" })).toBeVisible();
  await tove.getByLabel("Your password, again").fill(passwordOf("Tove"));
  await tove.getByRole("button", { name: "Sign", exact: true }).click();
  await expect(tove.getByRole("dialog")).toBeHidden();
  await tove.reload();
  await expect(tove.getByText("Released", { exact: true })).toBeVisible();

  // 6. The record: a page, a PDF, and JSON that the command line verifies by solving again.
  await tove.getByRole("link", { name: "Record" }).click();
  await expect(tove.getByText("FFC-2 Rev D against Rev B")).toBeVisible();
  const pdf = await download(tove, "Record as PDF", testInfo.outputPath("record.pdf"));
  expect((await readFile(pdf)).subarray(0, 5).toString()).toBe("%PDF-");
  const json = await download(tove, "Record as JSON", testInfo.outputPath("record.json"));
  expect(await verify(json)).toMatchObject({ code: 0, holds: true });
  const text = await readFile(json, "utf8");
  const forged = testInfo.outputPath("forged.json");
  await writeFile(forged, text.replace("Mended in Rev D", "Mended in Rev E"));
  expect(await verify(forged)).toMatchObject({ code: 1, holds: false });
});

async function changeValue(page: Page, part: string, label: string, value: string): Promise<void> {
  await page
    .getByRole("button", { name: new RegExp(`^${part}\\b`) })
    .first()
    .focus();
  await page.keyboard.press("Enter");
  const field = page.getByLabel(label, { exact: true });
  await field.fill(value);
  await field.press("Enter");
}

const problems = (page: Page) =>
  page.getByRole("complementary", { name: "Chosen part, problems and edits" });

async function download(page: Page, link: string, to: string): Promise<string> {
  const [file] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("link", { name: link }).click(),
  ]);
  await file.saveAs(to);
  return to;
}

async function verify(file: string): Promise<{ readonly code: number; readonly holds: boolean }> {
  const command = ["run", "--silent", "verify", "--", file];
  const { code, stdout } = await run("npm", command).then(
    (done) => ({ code: 0, stdout: done.stdout }),
    (failed: { code: number; stdout: string }) => failed,
  );
  return { code, holds: JSON.parse(stdout).holds };
}
