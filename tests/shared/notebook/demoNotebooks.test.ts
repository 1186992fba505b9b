/** The notebooks of the demonstration: sound, sensible, and the same from the command line. */
import { spawnSync } from "node:child_process";
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, describe, expect, it } from "vitest";
import { evaluateNotebook } from "../../../shared/notebook/evaluateNotebook";
import { readNotebookFile, writeNotebookFile } from "../../../shared/notebook/notebookFile";
import { resultDocument } from "../../../shared/notebook/resultDocument";
import type { CellResult } from "../../../shared/notebook/result";
import { numberIn } from "./evaluateCells";

const root = path.resolve(import.meta.dirname, "../../..");
const folder = path.join(root, "server/demo/notebooks");
const files = readdirSync(folder).filter((name) => name.endsWith(".md"));

function readFile(name: string) {
  const text = readFileSync(path.join(folder, name), "utf8");
  let count = 0;
  const reading = readNotebookFile(text, () => String((count += 1)));
  if (!reading.ok) throw new Error(reading.notes.map(({ message }) => message).join("\n"));
  return { text, ...reading };
}

const evaluated = new Map(
  files.map((name) => {
    const { document } = readFile(name);
    return [name, evaluateNotebook(document).evaluation] as const;
  }),
);

function cellOf(file: string, name: string): CellResult {
  return evaluated.get(file)!.cells.find(({ result }) => result.name === name)!.result;
}

describe.each(files)("%s", (file) => {
  it("is a notebook that is written back as it stands", () => {
    const { text, document, notes } = readFile(file);
    expect(notes).toEqual([]);
    expect(writeNotebookFile(document)).toBe(text);
  });

  it("has no faults but where one is meant", () => {
    const meant = file === "saranth-hydrostatic-limit.md" ? ["edge: no_exobase_runaway"] : [];
    const faults = evaluated
      .get(file)!
      .cells.flatMap(({ result }) =>
        result.notes.filter(({ level }) => level === "fault").map(({ code }) => `${result.name}: ${code}`),
      );
    expect(faults).toEqual(meant);
  });

  it("gives a source for every given value", () => {
    const { document } = readFile(file);
    for (const { kind, text } of document.cells) {
      if (kind !== "values" && kind !== "body") continue;
      for (const line of text.split("\n")) {
        const isComputed = /=.*[a-z_]+\.[A-Za-z]/.test(line) || /like|latitude/.test(line);
        if (!isComputed) expect(line).toMatch(/#\s\S/);
      }
    }
  });
});

describe("the numbers of the demonstration", () => {
  it.each([
    ["ilmara-dayside.md", "leak", 200, 400],
    ["tessal-quiet-star.md", "quiet_loss", 200, 500],
    ["nirel-half-atmosphere.md", "leaving", 1000, 2000],
    ["oda-perihelion.md", "at_perihelion", 500, 1200],
  ])("%s: the exobase of %s lies between %d and %d km", (file, escape, lowest, highest) => {
    const altitude = numberIn(cellOf(file, escape), "exobase.altitude") / 1e3;
    expect(altitude).toBeGreaterThan(lowest);
    expect(altitude).toBeLessThan(highest);
  });

  it("say of Saranth why there is no exobase", () => {
    const [fault] = cellOf("saranth-hydrostatic-limit.md", "edge").notes;
    expect(fault.message).toMatch(/^No exobase\..*leaves as a wind.*largest Knudsen number is/);
  });
});

describe("npm run evaluate", () => {
  const scratch = mkdtempSync(path.join(tmpdir(), "evaluate-"));
  afterAll(() => rmSync(scratch, { recursive: true }));

  function run(...commandLine: string[]) {
    const tsx = path.join(root, "node_modules/tsx/dist/cli.mjs");
    const { status, stdout, stderr } = spawnSync(
      process.execPath,
      [tsx, "scripts/evaluate.ts", ...commandLine],
      {
        cwd: root,
        encoding: "utf8",
      },
    );
    return { status, stdout, stderr };
  }

  function scratchFile(name: string, text: string | Uint8Array): string {
    const file = path.join(scratch, name);
    writeFileSync(file, text);
    return file;
  }

  it("prints with --json exactly what the evaluator answers", { timeout: 60_000 }, () => {
    const file = "ilmara-dayside.md";
    const { status, stdout } = run(path.join(folder, file), "--json");
    expect(status).toBe(0);
    expect(JSON.parse(stdout)).toEqual(resultDocument(evaluated.get(file)!));
  });

  it("prints a report with lines of the file, and ends with 2 on a fault", { timeout: 60_000 }, () => {
    const { status, stdout } = run(path.join(folder, "saranth-hydrostatic-limit.md"));
    expect(status).toBe(2);
    const { text } = readFile("saranth-hydrostatic-limit.md");
    const line = text.split("\n").indexOf("column   = thermosphere") + 1;
    expect(stdout).toContain(`line ${line}: fault: No exobase.`);
    expect(stdout).toMatch(/^body saranth \(fine\)$/m);
    expect(stdout).toMatch(/^ {2}surface_gravity +6\.6\d+\sm\ss⁻²$/m);
  });

  it("names the line of a bad file and ends with 1", { timeout: 60_000 }, () => {
    const file = scratchFile("bad.md", "# T\n\n```notebook\nformat = 1\ncolour = red\n```\n");
    const { status, stdout, stderr } = run(file);
    expect({ status, stdout }).toEqual({ status: 1, stdout: "" });
    expect(stderr).toContain(`${file}:5: No entry colour in the block notebook`);
  });

  it("refuses what is no text, what is not there, and what it does not know", { timeout: 60_000 }, () => {
    expect(run(scratchFile("binary.md", Uint8Array.of(0xff, 0xfe, 0x00)))).toMatchObject({
      status: 1,
      stdout: "",
    });
    expect(run(path.join(scratch, "none.md")).stderr).toContain("cannot be read");
    expect(run(scratchFile("good.md", "# T\n"), "--yaml").stderr).toContain("No option --yaml.");
    expect(run("--help")).toMatchObject({ status: 0, stdout: expect.stringContaining("Exit code") });
  });
});
