/**
 * Times the page in headless Chromium on the production build (`npm run bench:page`, after `npm run build`):
 * from a keystroke in the exospheric temperature to the painted figure, over 50 edits; and the size of the first page.
 * Timings decide no test.
 */
import { existsSync, readFileSync } from "node:fs";
import path from "node:path";
import { gzipSync } from "node:zlib";
import { launchBrowser, openPage, signInAs, startServer } from "../tests/e2e/harness";
import { entryLine, openNotebook, seeFirstFigure } from "../tests/e2e/notebookParts";

const client = path.resolve(import.meta.dirname, "../dist/client");
if (!existsSync(client)) {
  console.error("There is no build. Run npm run build first.");
  process.exit(1);
}

/** Scripts that the first page loads before anything is clicked: the entry and what it preloads. */
function firstPageBytes(): number {
  const html = readFileSync(path.join(client, "index.html"), "utf8");
  const names = [...html.matchAll(/(?:src|href)="\/(assets\/[^"]+\.js)"/g)].map((match) => match[1]!);
  return names.reduce((sum, name) => sum + gzipSync(readFileSync(path.join(client, name))).length, 0);
}

const quantile = (sorted: number[], share: number): number =>
  sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))]!;

type TimedWindow = Window & { elapsed?: Promise<number> };

/** Times, in ms, from the next key pressed on the page until a curve of the first figure has moved and is painted. */
function timeNextKey(): void {
  (window as TimedWindow).elapsed = new Promise((resolve) => {
    let pressed = 0;
    document.addEventListener("keydown", (event) => (pressed = event.timeStamp), {
      once: true,
      capture: true,
    });
    const observer = new MutationObserver((changes) => {
      if (!changes.some(({ target }) => (target as Element).classList.contains("js-line"))) return;
      observer.disconnect();
      requestAnimationFrame(() => {
        const { port1, port2 } = new MessageChannel();
        port1.onmessage = () => resolve(performance.now() - pressed);
        port2.postMessage(null);
      });
    });
    const figure = document.querySelector("figure .js-plotly-plot")!;
    observer.observe(figure, { subtree: true, attributes: true, attributeFilter: ["d"] });
  });
}

const server = await startServer();
const browser = await launchBrowser();
try {
  // High enough that the entry and the figure are both on screen: a figure that nobody sees waits.
  const { page } = await openPage(browser, { viewport: { width: 1440, height: 1200 } });
  await signInAs(page, server.origin, "Tamsin Orevale");
  await openNotebook(page, /Escape of hydrogen from Ilmara/);
  await seeFirstFigure(page);
  const samples: number[] = [];
  await entryLine(page, "T_quiet").click();
  await page.waitForTimeout(3000);
  // Behind the last digit of "T_quiet = 428".
  await page.keyboard.press("Home");
  for (let column = 0; column < "T_quiet = 428".length; column += 1) await page.keyboard.press("ArrowRight");
  for (let edit = 0; edit < 50; edit += 1) {
    await page.keyboard.press("Shift+ArrowLeft");
    await page.waitForTimeout(400);
    await page.evaluate(timeNextKey);
    await page.keyboard.press(String(edit % 10));
    samples.push(await page.evaluate(() => (window as TimedWindow).elapsed!));
  }
  samples.sort((a, b) => a - b);
  console.log(`key to painted figure, 50 edits: median ${quantile(samples, 0.5).toFixed(1)} ms`);
  console.log(`                                95th percentile ${quantile(samples, 0.95).toFixed(1)} ms`);
  console.log(`first page's JavaScript: ${(firstPageBytes() / 1000).toFixed(1)} kB gzip`);
} finally {
  await browser.close();
  await server.remove();
}
