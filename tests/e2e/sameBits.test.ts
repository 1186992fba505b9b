/**
 * A notebook answers the same bits in Chromium as in Node: the page's own workers of the production build beside the
 * sources run here, result documents compared as text.
 */
import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { NotebookDocument } from "../../shared/notebook/document";
import { evaluateNotebook } from "../../shared/notebook/evaluateNotebook";
import { finishTask } from "../../shared/notebook/finishTask";
import { readNotebookFile } from "../../shared/notebook/notebookFile";
import type { ResultDocument } from "../../shared/notebook/result";
import { resultDocument } from "../../shared/notebook/resultDocument";
import { taskRunner } from "../../shared/notebook/runTask";
import { launchBrowser, openPage, startServer, type RunningServer } from "./harness";

const root = path.resolve(import.meta.dirname, "../..");

/** Of a sweep or spread, so many points at most: enough to carry a difference, and soon done. */
const pointsOfTask = 64;

const longWork = `
\`\`\`sweep by_temperature
vary  = T_quiet from 380 K to 480 K in 4 steps
watch = leak.H.rate, leak.exobase.altitude
\`\`\`

\`\`\`spread sure
watch   = leak.H.rate, leak.exobase.altitude
samples = 64
\`\`\`
`;

function readDocument(text: string): NotebookDocument {
  let count = 0;
  const reading = readNotebookFile(text, () => `cell-${(count += 1)}`);
  if (!reading.ok) throw new Error(reading.notes.map(({ message }) => message).join("\n"));
  return reading.document;
}

const textOf = (file: string): string => readFileSync(path.join(root, file), "utf8");

const files = ["server/demo/notebooks", "tests/fixtures/notebooks"].flatMap((folder) =>
  readdirSync(path.join(root, folder))
    .filter((name) => name.endsWith(".md"))
    .map((name) => path.join(folder, name)),
);
const notebooks = [
  ...files.map((file) => ({ name: file, document: readDocument(textOf(file)) })),
  {
    name: "a sweep and a spread",
    document: readDocument(`${textOf("server/demo/notebooks/ilmara-dayside.md").trimEnd()}\n${longWork}`),
  },
];

function answerHere(document: NotebookDocument): string {
  const first = evaluateNotebook(document);
  const answers = new Map(
    first.tasks.map((task) => {
      const part = taskRunner(document, task)(0, Math.min(task.points, pointsOfTask));
      return [task.key, finishTask(document, task, [part])] as const;
    }),
  );
  return JSON.stringify(resultDocument(evaluateNotebook(document, first.memory, answers).evaluation));
}

/** Names of the workers' files in the build. */
const builtWorker = (name: string): string => {
  const file = readdirSync(path.join(root, "dist/client/assets")).find(
    (candidate) => candidate.startsWith(`${name}.worker-`) && candidate.endsWith(".js"),
  );
  if (!file) throw new Error(`The build has no worker ${name}. Run npm run build.`);
  return `/assets/${file}`;
};

/** The same in the page, by the calls that the page itself makes to its workers (Comlink's messages, written out). */
function answerInPage(page: Page, document: NotebookDocument): Promise<string> {
  const workers = { evaluation: builtWorker("evaluation"), task: builtWorker("task") };
  return page.evaluate(
    async ({ document, workers, pointsOfTask }) => {
      type Task = { key: string; points: number };
      type Answer = { engine: string; cells: { id: string; result: unknown }[]; tasks: Task[] };
      const open = (address: string) => {
        const worker = new Worker(address, { type: "module" });
        const call = (method: string, ...values: unknown[]): Promise<unknown> =>
          new Promise((resolve, reject) => {
            const id = Math.random().toString(36);
            worker.addEventListener("error", () => reject(new Error(`The worker ${address} failed.`)));
            worker.addEventListener("message", ({ data }) => {
              if (data.id !== id) return;
              if (data.type === "RAW") resolve(data.value);
              else reject(new Error(JSON.stringify(data.value)));
            });
            const argumentList = values.map((value) => ({ type: "RAW", value }));
            worker.postMessage({ id, type: "APPLY", path: [method], argumentList });
          });
        return { call, end: () => worker.terminate() };
      };
      const evaluation = open(workers.evaluation);
      let answer = (await evaluation.call("evaluate", "first", document)) as Answer;
      for (const task of answer.tasks) {
        const long = open(workers.task);
        await long.call("open", document, task);
        const part = await long.call("run", 0, Math.min(task.points, pointsOfTask));
        await evaluation.call("supply", await long.call("finish", document, task, [part]));
        long.end();
      }
      // Under another key nothing is remembered, and every cell is sent whole.
      answer = (await evaluation.call("evaluate", "second", document)) as Answer;
      evaluation.end();
      const cells = answer.cells.map(({ result }) => result);
      return JSON.stringify({ engine: answer.engine, title: document.title, cells });
    },
    { document, workers, pointsOfTask },
  );
}

describe("Chromium and Node", () => {
  let server: RunningServer;
  let browser: Browser;
  let page: Page;
  beforeAll(async () => {
    server = await startServer();
    browser = await launchBrowser();
    ({ page } = await openPage(browser));
    await page.goto(server.origin);
  });
  afterAll(async () => {
    await browser?.close();
    await server?.remove();
  });

  it.each(notebooks)("answer $name with the same bits", async ({ document }) => {
    const here = answerHere(document);
    expect(here.length).toBeGreaterThan(1000);
    expect(await answerInPage(page, document)).toBe(here);
  });

  it("have a sweep and a spread among them, computed", () => {
    const { cells } = JSON.parse(answerHere(notebooks.at(-1)!.document)) as ResultDocument;
    const [sweep, spread] = cells.slice(-2);
    expect(sweep.tables.rows).toHaveLength(5);
    expect(spread.values["leak.H.rate.median"].value).toBeGreaterThan(0);
  });
});
