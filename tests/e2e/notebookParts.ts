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
  await focusEntry(page, key);
  await typeEntry(page, key, value);
}

/** Puts the caret into an entry. */
export async function focusEntry(page: Page, key: string): Promise<void> {
  await scrollTo(page, entryLine(page, key));
  await entryLine(page, key).click();
}

/** Writes over the entry that the caret is in. */
export async function typeEntry(page: Page, key: string, value: string): Promise<void> {
  await page.keyboard.press("Home");
  await page.keyboard.press("Shift+End");
  await page.keyboard.insertText(`${key} = ${value}`);
}

/** Pastes plain text where the caret is. */
export async function paste(page: Page, text: string): Promise<void> {
  await page.evaluate((pasted) => {
    const clipboardData = new DataTransfer();
    clipboardData.setData("text/plain", pasted);
    document.activeElement?.dispatchEvent(
      new ClipboardEvent("paste", { clipboardData, bubbles: true, cancelable: true }),
    );
  }, text);
}

/** The numbers under the title, as they read. */
export const headline = (page: Page): Promise<string[]> => page.locator(".headline-number").allInnerTexts();

/** Waits until the server's draft holds this text and the bar says that everything is saved. */
export async function waitUntilSaved(page: Page, text: string): Promise<void> {
  const id = new URL(page.url()).pathname.split("/")[2]!;
  for (let tries = 0; tries < 300; tries += 1) {
    const answer = await page.request.get(new URL(`/api/notebooks/${id}`, page.url()).href);
    const { document } = (await answer.json().catch(() => ({}))) as {
      document?: { cells: { text: string }[] };
    };
    if (document?.cells.some((cell) => cell.text.includes(text))) {
      await page.locator(".save-status", { hasText: /^saved/ }).waitFor({ timeout: 20_000 });
      return;
    }
    await page.waitForTimeout(100);
  }
  throw new Error(`The server's draft does not hold "${text}" after half a minute.`);
}

/** Scrolls down to where a cell's answer stands, as a reader would; answers are drawn near the window only. */
export async function seeTable(page: Page, caption: RegExp): Promise<Locator> {
  const table = page.getByRole("region", { name: caption }).first();
  await scrollTo(page, table);
  return table;
}

/** Scrolls down until a part of the page is drawn: what is far from the window waits. */
async function scrollTo(page: Page, part: Locator): Promise<void> {
  for (let tries = 0; tries < 60 && (await part.count()) === 0; tries += 1) {
    await page.mouse.wheel(0, 400);
    await page.waitForTimeout(150);
  }
  await part.scrollIntoViewIfNeeded();
}

/** Scrolls to the first figure, which is drawn only where it is seen. */
export async function seeFirstFigure(page: Page): Promise<void> {
  await scrollTo(page, page.locator("figure").first());
  await page.locator(".js-plotly-plot").first().waitFor({ timeout: 30_000 });
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
