import AxeBuilder from "@axe-core/playwright";
import { expect, test } from "@playwright/test";
import { signInAs } from "./sign-in";

const SCREENS = [
  { name: "register", path: "/", landmark: "Drawing register" },
  { name: "review", path: "/designs/FFC-2/reviews/C", landmark: "Rev C against Rev B" },
  { name: "draft", path: "/designs/FFC-2", landmark: "Problems in this draft" },
  { name: "record", path: "/designs/FFC-2/reviews/B/record", landmark: "Check this record" },
];
const SIZES = [
  { width: 1440, height: 900 },
  { width: 1920, height: 1080 },
  { width: 820, height: 1180 },
];

for (const { name, path, landmark } of SCREENS) {
  test(`the ${name} is whole and accessible at three widths in both themes`, async ({
    page,
    baseURL,
  }, testInfo) => {
    await signInAs(page, "reviewer", path);
    for (const theme of ["paper", "blueprint"]) {
      await page.context().addCookies([{ name: "theme", value: theme, url: baseURL ?? "" }]);
      for (const size of SIZES) {
        await page.setViewportSize(size);
        await page.goto(path);
        await expect(page.getByText(landmark).first()).toBeVisible();
        await expect(page.locator("html")).toHaveAttribute("data-theme", theme);
        const overflow = await page.evaluate(
          () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
        );
        expect(overflow, `${name} at ${size.width} is wider than the window`).toBeLessThanOrEqual(
          0,
        );
        const { violations } = await new AxeBuilder({ page }).analyze();
        expect(
          violations.map(
            ({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target).join(" ")}`,
          ),
          `${name}, ${theme}, ${size.width}`,
        ).toEqual([]);
        await page.screenshot({
          path: testInfo.outputPath(`${name}-${size.width}-${theme}.png`),
          fullPage: size.width < 1101,
        });
      }
    }
  });
}

test("a stranger's design and a design that is not there are the same page", async ({ page }) => {
  await signInAs(page, "observer", "/designs/XYZ-9/reviews/A");
  await expect(page.getByRole("heading", { name: "There is nothing here for you" })).toBeVisible();
  const answers = await Promise.all(
    ["/designs/XYZ-9", "/designs/XYZ-9/reviews/A/record/json", "/api/runs/sha256:0"].map((path) =>
      page.request.get(path),
    ),
  );
  expect(answers.map((answer) => answer.status())).toEqual([404, 404, 404]);
});

test("the server's end is said, edits are kept, and sent when it is back", async ({ page }) => {
  let away = false;
  const lines = new Set<{ close: () => Promise<void> }>();
  await page.routeWebSocket(/\/doc\//, (line) => {
    if (away) return void line.close({ code: 1012 });
    line.connectToServer();
    lines.add(line);
  });
  await signInAs(page, "designer", "/designs/FFC-2");
  await expect(page.getByText("Saved", { exact: true })).toBeVisible();
  away = true;
  for (const line of lines) await line.close();
  await page.getByRole("button", { name: "Place a resistor" }).click();
  await expect(page.getByText("Not saved: 1 edit")).toBeVisible();
  away = false;
  await expect(page.getByText("Saved", { exact: true })).toBeVisible();
  await page.getByRole("button", { name: "Undo" }).click();
  await expect(page.getByText("Saved", { exact: true })).toBeVisible();
});
