import type { Locator, Page } from "playwright-core";

/** Opens a notebook from the list by the beginning of its title. */
export async function openNotebook(page: Page, title: RegExp): Promise<void> {
  await page.getByRole("link", { name: title }).first().click();
  await page.locator(".headline-number").first().waitFor();
}

/** The line of an entry in a cell's editor. */
export const entryLine = (page: Page, key: string): Locator =>
  page.locator(".cm-line", { hasText: new RegExp(`^${key}\\s*=`) }).first();

/** Writes another value in an entry's place, as a person would: to the end of its line, back to the sign, over it. */
export async function writeEntry(page: Page, key: string, value: string): Promise<void> {
  const line = entryLine(page, key);
  await line.scrollIntoViewIfNeeded();
  await line.click();
  await page.keyboard.press("Home");
  await page.keyboard.press("Shift+End");
  await page.keyboard.insertText(`${key} = ${value}`);
}

/** The numbers under the title, as they read. */
export const headline = (page: Page): Promise<string[]> => page.locator(".headline-number").allInnerTexts();

/** Waits until the bar says that everything is saved. */
export async function waitUntilSaved(page: Page): Promise<void> {
  await page.waitForTimeout(250);
  await page.locator(".save-status", { hasText: /^saved/ }).waitFor({ timeout: 20_000 });
}

/** Waits for a number of the headline to differ from what it was. */
export async function waitForHeadline(page: Page, index: number, before: string): Promise<string> {
  await page.waitForFunction(
    ([at, old]) => {
      const number = document.querySelectorAll<HTMLElement>(".headline-number")[at as number];
      return number !== undefined && !number.closest("[data-late]") && number.innerText !== old;
    },
    [index, before] as const,
    { timeout: 20_000 },
  );
  return (await headline(page))[index]!;
}
