import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import type { AxeResults } from "axe-core";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { launchBrowser, openPage, signInAs, startServer, type RunningServer } from "./harness";
import { openNotebook, seeFirstFigure } from "./notebookParts";

let server: RunningServer;
let browser: Browser;
let axeSource: string;
beforeAll(async () => {
  server = await startServer();
  browser = await launchBrowser();
  axeSource = await readFile(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");
});
afterAll(async () => {
  await browser?.close();
  await server?.remove();
});

/**
 * Numbers say their names with "10^58.9", which is seen as 10 with 58.9 above it: the rule that compares the two, which
 * axe calls experimental, takes what is seen for 1058.9.
 */
const isRaisedNumber = (rule: string, selector: string): boolean =>
  rule === "label-content-name-mismatch" && selector.startsWith("span[data-number=");

/** What axe finds against WCAG 2.2 A and AA, as "rule: selector". */
async function violations(page: Page): Promise<string[]> {
  await page.evaluate(axeSource);
  const results = await page.evaluate(() =>
    (window as unknown as { axe: { run(options: object): Promise<AxeResults> } }).axe.run({
      runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"],
    }),
  );
  return results.violations.flatMap((violation) =>
    violation.nodes
      .map((node) => node.target.join(" "))
      .filter((selector) => !isRaisedNumber(violation.id, selector))
      .map((selector) => `${violation.id}: ${selector}`),
  );
}

// Each light and each width once: colours rest on the one, room and targets on the other.
describe.each([
  ["light", 1440],
  ["dark", 390],
] as const)("by %s, %i pixels wide", (colorScheme, width) => {
  const viewport = { width, height: 900 };

  it("the pages that are open to everyone meet WCAG 2.2 AA", async () => {
    const { page, context } = await openPage(browser, { colorScheme, viewport });
    await page.goto(server.origin);
    await page.getByRole("heading", { name: "Sign in" }).waitFor();
    expect(await violations(page)).toEqual([]);
    await page.getByRole("link", { name: /Handbook/ }).click();
    await page.getByRole("heading", { name: "Handbook", level: 1 }).waitFor();
    expect(await violations(page)).toEqual([]);
    await context.close();
  });

  it("the pages behind it do too, and none is wider than the window", async () => {
    const { page, context } = await openPage(browser, { colorScheme, viewport });
    await signInAs(page, server.origin, "Jorun Aldaker");
    const found: Record<string, string[]> = {};
    const look = async (name: string): Promise<void> => {
      found[name] = await violations(page);
      const overflow = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      if (overflow > 0) found[name].push(`wider than the window by ${overflow} px`);
    };
    await look("notebooks");
    await page.goto(`${server.origin}/groups`);
    await page
      .getByRole("link", { name: /Carrow Aeronomy/ })
      .first()
      .click();
    await page.getByRole("heading", { name: /Carrow Aeronomy/ }).waitFor();
    await look("group");
    await page.goto(`${server.origin}/account`);
    await page.getByRole("heading", { level: 1 }).waitFor();
    await look("account");
    await page.goto(`${server.origin}/handbook?pairs=all`);
    await page.getByRole("heading", { name: "Handbook", level: 1 }).waitFor();
    await look("handbook");
    await page.getByRole("button", { name: "Put into a notebook: Mars" }).click();
    await page.getByRole("dialog").waitFor();
    await look("putting into a notebook");
    await page.goto(`${server.origin}/nowhere`);
    await page.getByRole("heading", { level: 1 }).waitFor();
    await look("not found");
    await page.goto(server.origin);
    await openNotebook(page, /Escape of hydrogen from Ilmara/);
    await seeFirstFigure(page);
    await look("notebook");
    await page.goto(`${page.url()}/compare?older=1&newer=draft`);
    await seeFirstFigure(page);
    await look("two states compared");
    for (const [name, list] of Object.entries(found)) expect(list, name).toEqual([]);
    await context.close();
  });
});

it("The main job can be done by keyboard alone", async () => {
  const { page, context } = await openPage(browser);
  await page.goto(server.origin);
  await page.getByRole("heading", { name: "Sign in" }).waitFor();
  const tabTo = async (reached: () => Promise<boolean>): Promise<void> => {
    for (let presses = 0; presses < 80; presses += 1) {
      if (await reached()) return;
      await page.keyboard.press("Tab");
    }
    throw new Error("Not reached by Tab.");
  };
  const focusedText = (): Promise<string> => page.evaluate(() => document.activeElement?.textContent ?? "");
  await tabTo(async () => /^Tamsin Orevale$/.test(await focusedText()));
  await page.keyboard.press("Enter");
  await page.getByRole("heading", { name: "Notebooks", level: 1 }).waitFor();
  await tabTo(async () => /^Escape of hydrogen from Ilmara/.test(await focusedText()));
  await page.keyboard.press("Enter");
  await page.locator(".headline-number").first().waitFor();
  const before = await page.locator(".headline-number").first().innerText();

  await tabTo(async () =>
    page.evaluate(() =>
      (document.activeElement?.getAttribute("aria-label") ?? "").includes("Entries of Values given"),
    ),
  );
  await page.keyboard.press("Control+Home");
  await page.keyboard.press("Shift+End");
  await page.keyboard.insertText("T_quiet = 540 ± 45 K");
  await page.waitForFunction(
    (old) => document.querySelector<HTMLElement>(".headline-number")?.innerText !== old,
    before,
  );
  await page.keyboard.press("Escape");
  await page.keyboard.press("Tab");
  expect(await page.evaluate(() => document.activeElement?.closest(".cm-editor") === null)).toBe(true);
  await context.close();
});
