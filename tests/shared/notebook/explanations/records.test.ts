import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import katex from "katex";
import { describe, expect, it } from "vitest";
import { references } from "../../../../shared/physics";
import type { Cell } from "../../../../shared/notebook/document";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import { completeNotebook } from "../../../../shared/notebook/completeNotebook";
import { explain, type ResultPlace } from "../../../../shared/notebook/explanations/explain";
import { explanations, findRecord } from "../../../../shared/notebook/explanations/explanations";
import { readNotebookFile } from "../../../../shared/notebook/notebookFile";
import { coldAndCoupled, completed, everyKind } from "./everyKind";

const root = path.resolve(import.meta.dirname, "../../../../");
const records = Object.values(explanations).flat();

interface Explained {
  cells: Cell[];
  evaluations: CellEvaluation[];
}

function demoNotebooks(): Explained[] {
  const folder = path.join(root, "server/demo/notebooks");
  return readdirSync(folder).map((file) => {
    let count = 0;
    const reading = readNotebookFile(readFileSync(path.join(folder, file), "utf8"), () =>
      String((count += 1)),
    );
    if (!reading.ok) throw new Error(`${file} is no notebook`);
    return { cells: reading.document.cells, evaluations: completeNotebook(reading.document).cells };
  });
}

const notebooks: Explained[] = [completed(everyKind), completed(coldAndCoupled), ...demoNotebooks()];

/** Tables whose rows a page sets as numbers, and the column that tells their rows apart. */
const explainedTables: Readonly<Record<string, string>> = {
  levels: "altitude",
  history: "age",
  channels: "products",
  sensitivity: "input",
  rows: "T_quiet",
};

function placesIn({ evaluations }: Explained): ResultPlace[] {
  return evaluations.flatMap(({ result: { name: cell, values, tables } }) => [
    ...Object.keys(values).map((name) => ({ cell, name })),
    ...Object.entries(explainedTables).flatMap(([table, column]) =>
      (tables[table] ?? []).slice(0, 1).flatMap((row) =>
        Object.keys(row)
          .filter((key) => typeof row[key] === "number" && !key.endsWith("_error"))
          .map((key) => ({ cell, name: `${table}.${key}`, row: { column, value: row[column]! } })),
      ),
    ),
  ]);
}

describe("the record of a result", () => {
  it("stands for every result of the demonstration and of a notebook with all kinds of cell", () => {
    const unexplained = notebooks.flatMap((notebook) =>
      placesIn(notebook).filter((place) => explain(notebook.cells, notebook.evaluations, place) === null),
    );
    expect(unexplained).toEqual([]);
  });

  it("is one of a kind", () => {
    const ids = records.map(({ id }) => id);
    expect(ids.filter((id, index) => ids.indexOf(id) !== index)).toEqual([]);
    for (const of of Object.values(explanations)) {
      const names = of.map(({ name }) => name);
      expect(new Set(names).size).toBe(names.length);
    }
  });

  it.each(records.filter(({ formula }) => formula !== null))(
    "$id names the physics that cites it",
    (record) => {
      const [file, name] = record.physics?.split("#") ?? [];
      expect(file, `${record.id} has a formula, but no physics`).toBeDefined();
      const text = readFileSync(path.join(root, "shared/physics", file!), "utf8");
      const at = text.indexOf(`export function ${name}(`);
      expect(at, `${file} has no function ${name}`).toBeGreaterThan(0);
      const docstring = text.slice(text.lastIndexOf("/**", at), at);
      expect(docstring.match(/@explained ([\s\S]*?)(?:\n \* @|\n \*\/)/)?.[1].split(/[,\s*]+/)).toContain(
        record.id,
      );
    },
  );

  it("is there for every @explained of the physics", () => {
    const ids = new Set(records.map(({ id }) => id));
    const cited = readdirSync(path.join(root, "shared/physics"), { recursive: true, encoding: "utf8" })
      .filter((file) => file.endsWith(".ts"))
      .flatMap((file) => {
        const text = readFileSync(path.join(root, "shared/physics", file), "utf8");
        return [...text.matchAll(/@explained ([\s\S]*?)(?:\n \* @|\n \*\/)/g)].flatMap(([, all]) =>
          all.split(/[,\s*]+/),
        );
      });
    expect(cited.length).toBeGreaterThan(60);
    expect(cited.filter((id) => !ids.has(id))).toEqual([]);
  });

  it("has sources that are among the references", () => {
    for (const { id, sources } of records)
      for (const key of sources) expect(references, id).toHaveProperty([key]);
  });

  it("says of every formula who published it and where it holds", () => {
    for (const { id, formula, sources, validity } of records) {
      if (formula !== null) expect(sources.length, `${id} names no source`).toBeGreaterThan(0);
      if (formula !== null) expect(validity, `${id} does not say where it holds`).toMatch(/\.$/);
    }
  });

  it.each(records)("$id is set without a mistake in its TeX", ({ symbol, formula, forms, with: inputs }) => {
    const all = [symbol, ...(formula === null ? [] : [formula]), ...Object.values(forms?.formulas ?? {})];
    for (const tex of [...all, ...inputs.map((input) => input.symbol)])
      expect(() => katex.renderToString(tex, { throwOnError: true, strict: "error" })).not.toThrow();
  });

  it("has only inputs that some notebook resolves, and all of those that it needs wherever it is used", () => {
    const everResolved = new Map<string, Set<string>>();
    for (const notebook of notebooks) {
      for (const place of placesIn(notebook)) {
        const kind = notebook.evaluations.find(({ result }) => result.name === place.cell)!.result.kind;
        const record = findRecord(kind, place.name)?.record;
        if (!record) continue;
        const symbols = explain(notebook.cells, notebook.evaluations, place)!.inputs.map(
          ({ symbol }) => symbol,
        );
        const seen = everResolved.get(record.id) ?? new Set();
        for (const symbol of symbols) seen.add(symbol);
        everResolved.set(record.id, seen);
        const needed = record.with.filter(({ isOptional }) => !isOptional).map(({ symbol }) => symbol);
        const where = `${place.cell}.${place.name}`;
        for (const symbol of needed) expect(symbols, `${where} lacks ${symbol}`).toContain(symbol);
      }
    }
    for (const { id, with: inputs } of records) {
      expect(everResolved.has(id), `no notebook here has a result for ${id}`).toBe(true);
      for (const { symbol } of inputs) expect([...everResolved.get(id)!], id).toContain(symbol);
    }
  });
});
