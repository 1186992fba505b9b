import { execFile } from "node:child_process";
import { readFile, writeFile } from "node:fs/promises";
import path from "node:path";
import { promisify } from "node:util";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import type { ResultDocument } from "../../shared/notebook/result";
import type { FigureDrawing } from "../../src/ui/plots/exportFigure";
import { curvePath } from "../../src/ui/plots/moveCurves";
import { launchBrowser, openPage, signInAs, startServer, type RunningServer } from "./harness";
import {
  entryLine,
  focusEntry,
  headline,
  openNotebook,
  paste,
  seeFirstFigure,
  seeTable,
  typeEntry,
  waitForHeadline,
  waitUntilSaved,
  writeEntry,
} from "./notebookParts";

const root = path.resolve(import.meta.dirname, "../..");
const ilmara = /Escape of hydrogen from Ilmara/;

let server: RunningServer;
let browser: Browser;
beforeAll(async () => {
  server = await startServer();
  browser = await launchBrowser();
});
afterAll(async () => {
  await browser?.close();
  await server?.remove();
});

it("A researcher changes the exospheric temperature, sees every answer move, and finds it all after a power cut", async () => {
  const { page, context, complaints } = await openPage(browser);
  const foreign: string[] = [];
  page.on("request", (request) => {
    if (!/^(data|blob):/.test(request.url()) && !request.url().startsWith(server.origin))
      foreign.push(request.url());
  });
  await signInAs(page, server.origin, "Tamsin Orevale");
  await openNotebook(page, ilmara);
  await seeFirstFigure(page);
  const [exobaseBefore, rateBefore] = await headline(page);
  const tableBefore = await (await seeTable(page, /Thermal escape/)).innerText();

  await writeEntry(page, "T_quiet", "520 ± 45 K");
  const exobaseAfter = await waitForHeadline(page, 0, exobaseBefore!);
  const rateAfter = await waitForHeadline(page, 1, rateBefore!);
  const kilometres = (text: string): number => Number(text.replace(/[^\d.]/g, ""));
  expect(kilometres(exobaseAfter)).toBeGreaterThan(kilometres(exobaseBefore!));
  expect(rateAfter).not.toBe(rateBefore);
  expect(await (await seeTable(page, /Thermal escape/)).innerText()).not.toBe(tableBefore);
  await waitUntilSaved(page, "T_quiet = 520 ± 45 K");

  await server.restart();
  await page.reload();
  await page.locator(".headline-number").first().waitFor();
  expect((await headline(page))[0]).toBe(exobaseAfter);
  expect(await entryLine(page, "T_quiet").innerText()).toContain("520 ± 45 K");
  expect(foreign).toEqual([]);
  expect(complaints).toEqual([]);
  await context.close();
});

it("Curves that follow a key are written where the figure library draws them, and leave a dark page as by day", async () => {
  const { page, context } = await openPage(browser, { acceptDownloads: true, colorScheme: "dark" });
  await signInAs(page, server.origin, "Tamsin Orevale");
  await openNotebook(page, ilmara);
  await seeFirstFigure(page);
  const drawn = await page
    .locator(".js-plotly-plot")
    .first()
    .evaluate((graph) => {
      const { data, layout } = graph as unknown as FigureDrawing;
      const paths = [...graph.querySelectorAll(".scatterlayer .js-line")].map((path) =>
        path.getAttribute("d")!,
      );
      return { data, layout, paths };
    });
  const ends = (path: string): number[] => {
    const points = path.slice(1).split("L");
    return [points[0]!, points.at(-1)!].flatMap((point) => point.split(",").map(Number));
  };
  expect(drawn.paths.length).toBeGreaterThan(8);
  drawn.paths.forEach((path, i) => {
    const written = ends(curvePath(drawn.data[i] as Parameters<typeof curvePath>[0], drawn.layout));
    ends(path).forEach((pixel, k) => expect(Math.abs(pixel - written[k]!)).toBeLessThan(0.6));
  });

  const [download] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("button", { name: "Save figure 1 as SVG" }).click(),
  ]);
  const svg = await readFile(await download.path(), "utf8");
  // Ink by day; by night it is rgb(232, 230, 222).
  expect(svg).toContain("rgb(27, 34, 48)");
  expect(svg).not.toContain("rgb(232, 230, 222)");
  await context.close();
});

it("The notebook exported as Markdown gives the same numbers on the command line as in a kept version", async () => {
  const { page, context } = await openPage(browser, { acceptDownloads: true });
  await signInAs(page, server.origin, "Tamsin Orevale");
  await openNotebook(page, ilmara);
  const id = new URL(page.url()).pathname.split("/")[2]!;

  await page.getByRole("button", { name: "Keep a version" }).click();
  await page.getByLabel("What this version is").fill("Before the second campaign");
  await page.getByRole("dialog").getByRole("button", { name: "Keep a version" }).click();
  await page.getByText(/Kept as version \d+/).waitFor();

  await page.getByRole("button", { name: "More", exact: true }).click();
  const [download] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("menuitem", { name: "Export as Markdown" }).click(),
  ]);
  const file = path.join(server.dataFolder, "exported.md");
  await writeFile(file, await readFile(await download.path()));
  const { stdout } = await promisify(execFile)("npx", ["tsx", "scripts/evaluate.ts", file, "--json"], {
    cwd: root,
  });
  const onCommandLine = JSON.parse(stdout) as ResultDocument;

  const listed = (await (
    await context.request.get(`${server.origin}/api/notebooks/${id}/versions`)
  ).json()) as {
    versions?: { number: number }[];
  } & { number: number }[];
  const newest = Math.max(...(listed.versions ?? listed).map((version) => version.number));
  const kept = (await (
    await context.request.get(`${server.origin}/api/notebooks/${id}/versions/${newest}`)
  ).json()) as { result: ResultDocument };
  const valuesOf = (document: ResultDocument) => document.cells.map(({ name, values }) => ({ name, values }));
  expect(valuesOf(onCommandLine).some(({ values }) => "exobase.altitude" in values)).toBe(true);
  expect(valuesOf(onCommandLine)).toEqual(valuesOf(kept.result));
  await context.close();
});

it("A mistake is marked where it stands, with a remedy, and the text stays as typed", async () => {
  const { page, context, complaints } = await openPage(browser);
  await signInAs(page, server.origin, "Tamsin Orevale");
  await openNotebook(page, ilmara);
  await writeEntry(page, "T_base", "165 km");
  await page
    .locator(".entry-note-fault", { hasText: /temperature/i })
    .first()
    .waitFor();
  expect(await entryLine(page, "T_base").innerText()).toContain("165 km");
  await writeEntry(page, "T_base", "165 K");
  await waitUntilSaved(page, "T_base = 165 K");
  expect(complaints).toEqual([]);
  await context.close();
});

it("A reader sees the numbers and cannot write; a co-author can; a stranger finds nothing", async () => {
  const reader = await openPage(browser);
  await signInAs(reader.page, server.origin, "Pello Marrash");
  await openNotebook(reader.page, ilmara);
  const asRead = await entryLine(reader.page, "T_quiet").innerText();
  await entryLine(reader.page, "T_quiet").click();
  await reader.page.keyboard.type("9");
  await reader.page.keyboard.press("Backspace");
  expect(await entryLine(reader.page, "T_quiet").innerText()).toBe(asRead);
  expect(await reader.page.getByRole("button", { name: "Keep a version" }).count()).toBe(0);
  const address = reader.page.url();
  await reader.context.close();

  const coAuthor = await openPage(browser);
  await signInAs(coAuthor.page, server.origin, "Wiremu Castellane");
  await openNotebook(coAuthor.page, ilmara);
  await writeEntry(coAuthor.page, "H_share", "1.3 ppm within factor 1.5");
  await waitUntilSaved(coAuthor.page, "H_share = 1.3 ppm");
  await coAuthor.context.close();

  const stranger = await openPage(browser);
  await stranger.page.goto(`${server.origin}/accounts/new`);
  await stranger.page.getByLabel("Name").fill("Ansa Kell");
  await stranger.page.getByLabel("E-mail").fill("ansa.kell@kell.example");
  await stranger.page.getByLabel("Password", { exact: true }).fill("a long walk at dusk");
  await stranger.page.getByRole("button", { name: "Create" }).click();
  await stranger.page.getByRole("heading", { name: "Notebooks", level: 1 }).waitFor();
  await stranger.page.goto(address);
  await stranger.page.getByRole("heading", { name: "Not found" }).waitFor();
  await stranger.context.close();
});

it("Two tabs that change the same entry settle it without losing either state", async () => {
  const one = await openPage(browser);
  await signInAs(one.page, server.origin, "Tamsin Orevale");
  await openNotebook(one.page, ilmara);
  const two = await openPage(browser);
  await signInAs(two.page, server.origin, "Wiremu Castellane");
  await openNotebook(two.page, ilmara);

  // Out of reach while the other saves: else the other's save shows up here at once, and there is nothing to settle.
  await two.context.setOffline(true);
  await writeEntry(one.page, "K_base", "3e6 cm^2/s within factor 2");
  await waitUntilSaved(one.page, "K_base = 3e6 cm^2/s");
  await writeEntry(two.page, "K_base", "5e5 cm^2/s within factor 3");
  await two.context.setOffline(false);
  const panel = two.page.getByRole("region", { name: "Two states to settle" });
  await panel.waitFor();
  expect(await panel.innerText()).toContain("3e6 cm^2/s within factor 2");
  expect(await panel.innerText()).toContain("5e5 cm^2/s within factor 3");
  await panel.getByRole("radio", { name: /3e6/ }).click();
  await panel.getByRole("button", { name: "Save as chosen" }).click();
  await panel.waitFor({ state: "detached" });
  await two.page.locator(".cm-line", { hasText: "K_base = 3e6 cm^2/s" }).waitFor();
  await one.context.close();
  await two.context.close();
});

it("Without a network the text is kept here, and saved when the server is back", async () => {
  const { page, context } = await openPage(browser);
  await signInAs(page, server.origin, "Tamsin Orevale");
  await openNotebook(page, ilmara);
  await context.setOffline(true);
  await writeEntry(page, "T_base", "171 K");
  await page
    .locator(".save-status", { hasText: /not saved: (offline|the server does not answer)/ })
    .waitFor();
  await context.setOffline(false);
  await waitUntilSaved(page, "T_base = 171 K");
  await page.reload();
  await page.locator(".headline-number").first().waitFor();
  expect(await entryLine(page, "T_base").innerText()).toContain("171 K");
  await context.close();
});

it("After the session has ended, one signs in again and what was written is saved", async () => {
  const { page, context } = await openPage(browser);
  await signInAs(page, server.origin, "Tamsin Orevale");
  await openNotebook(page, ilmara);
  // In the entry already: an open page that learns of the end first asks for the sign-in before anything is written.
  await focusEntry(page, "T_base");
  await context.clearCookies();
  await typeEntry(page, "T_base", "169 K");
  await page.getByText(/session has ended/).waitFor();
  await page.getByRole("button", { name: "Tamsin Orevale" }).click();
  await waitUntilSaved(page, "T_base = 169 K");
  await page.reload();
  await page.locator(".headline-number").first().waitFor();
  expect(await entryLine(page, "T_base").innerText()).toContain("169 K");
  await context.close();
});

it("Ten thousand pasted lines neither freeze the page nor get lost", async () => {
  const { page, context, complaints } = await openPage(browser);
  await signInAs(page, server.origin, "Tamsin Orevale");
  await openNotebook(page, ilmara);
  const line = entryLine(page, "H_share");
  await line.click();
  await page.keyboard.press("End");
  const lines = Array.from({ length: 10_000 }, (_, index) => `q_${index} = ${index} m`).join("\n");
  await paste(page, `\n${lines}`);
  const begun = Date.now();
  await page.getByRole("button", { name: "More", exact: true }).click({ timeout: 10_000 });
  await page.getByRole("menuitem", { name: "Print" }).waitFor({ timeout: 10_000 });
  expect(Date.now() - begun).toBeLessThan(10_000);
  await page.keyboard.press("Escape");
  await waitUntilSaved(page, "q_9999 = 9999 m");
  expect(complaints).toEqual([]);
  await context.close();
});
