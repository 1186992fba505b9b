/**
 * Times the page in headless Chromium on the production build (`npm run bench:page`, after `npm run build`):
 * from a keystroke in the exospheric temperature to the redrawn figure, over 50 edits; and the size of the first page.
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

const server = await startServer();
const browser = await launchBrowser();
try {
  // High enough that the entry and the figure are both on screen: a figure that nobody sees waits.
  const { page } = await openPage(browser, { viewport: { width: 1440, height: 2000 } });
  await signInAs(page, server.origin, "Tamsin Orevale");
  await openNotebook(page, /Escape of hydrogen from Ilmara/);
  await seeFirstFigure(page);
  const samples: number[] = [];
  await entryLine(page, "T_quiet").click();
  await page.waitForTimeout(3000);
  for (let edit = 0; edit < 50; edit += 1) {
    const value = 400 + edit;
    const elapsed = await page.evaluate(async (temperature) => {
      const editor = document.activeElement?.closest(".cm-editor");
      const host = editor?.querySelector(".cm-content") as
        (HTMLElement & { cmTile?: { view?: unknown }; cmView?: { view?: unknown } }) | null;
      const view = (host?.cmTile?.view ?? host?.cmView?.view) as {
        state: { doc: { toString(): string } };
        dispatch(change: object): void;
      };
      const text = view.state.doc.toString();
      const number = /T_quiet\s*=\s*(\d+)/.exec(text)!;
      const from = number.index + number[0].length - number[1]!.length;
      const figure = document.querySelector("figure .js-plotly-plot") as HTMLElement & {
        once(event: string, handler: () => void): void;
      };
      return new Promise<number>((resolve) => {
        const begun = performance.now();
        figure.once("plotly_afterplot", () => resolve(performance.now() - begun));
        view.dispatch({
          changes: { from, to: from + number[1]!.length, insert: String(temperature) },
          userEvent: "input.type",
        });
      });
    }, value);
    samples.push(elapsed);
    await page.waitForTimeout(400);
  }
  samples.sort((a, b) => a - b);
  console.log(`keystroke to figure, 50 edits: median ${quantile(samples, 0.5).toFixed(1)} ms`);
  console.log(`                               95th percentile ${quantile(samples, 0.95).toFixed(1)} ms`);
  console.log(`first page's JavaScript: ${(firstPageBytes() / 1000).toFixed(1)} kB gzip`);
} finally {
  await browser.close();
  await server.remove();
}
