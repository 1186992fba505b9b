/** Takes the screenshots of the README from the production build and the demonstration: after `npm run build`. */
import { mkdirSync } from "node:fs";
import path from "node:path";
import { launchBrowser, openPage, signInAs, startServer } from "../tests/e2e/harness";
import { openNotebook } from "../tests/e2e/notebookParts";

const folder = path.resolve(import.meta.dirname, "../docs/images");
mkdirSync(folder, { recursive: true });

const server = await startServer();
const browser = await launchBrowser();
try {
  for (const colorScheme of ["light", "dark"] as const) {
    const { page, context } = await openPage(browser, {
      colorScheme,
      viewport: { width: 1440, height: 1000 },
    });
    await signInAs(page, server.origin, "Tamsin Orevale");
    await openNotebook(page, /Escape of hydrogen from Ilmara/);
    await page.locator("figure").first().scrollIntoViewIfNeeded();
    await page.locator(".js-plotly-plot").first().waitFor();
    await page.locator(".cm-line", { hasText: /^temperature/ }).evaluate((line) => line.scrollIntoView());
    await page.mouse.wheel(0, -260);
    await page.waitForTimeout(2500);
    await page.screenshot({ path: path.join(folder, `notebook-${colorScheme}.png`) });
    await context.close();
  }
} finally {
  await browser.close();
  await server.remove();
}
