import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { evaluateExpression } from "../../../../shared/notebook/language/evaluateExpression";
import { cellParser } from "../../../../shared/notebook/language/parser";
import { parseEntries } from "../../../../shared/notebook/language/parseEntries";
import { readEddy } from "../../../../shared/notebook/language/readEddy";
import { readGasList } from "../../../../shared/notebook/language/readGasList";
import { readLevels } from "../../../../shared/notebook/language/readLevels";
import { readTemperature } from "../../../../shared/notebook/language/readTemperature";
import type { ValueNode } from "../../../../shared/notebook/language/syntax";
import { understoodText } from "../../../../shared/notebook/language/understoodText";
import type { Note } from "../../../../shared/notebook/result";
import { scopeOf } from "./evaluated";

const scope = scopeOf({
  T_quiet: { value: 240, dimension: [0, 0, 0, 1, 0, 0] },
  x: { value: 3, dimension: [0, 0, 0, 0, 0, 0] },
  leak: "a cell",
  gone: { unavailable: "It has a fault." },
});

/** Pieces from which entries, and things that are almost entries, are made. */
const piece = fc.constantFrom(
  ..."= + - * / ^ ( ) , : ; # % ± +- ** . × \n \r\n \t 1 0 2.5 1e5 1e300 1e-300 10^10^10 1,5 1\u202f000 x T_quiet leak gone".split(
    " ",
  ),
  " ",
  ..."K km cm^2 s⁻¹ ppm °C min H CO₂ rest between and within factor 2 sqrt( bates( points( power( base exosphere \u202e \u200b \ufeff α 𝛼 \ud800 \" ' [ ] { } < $ \\ \u2028".split(
    " ",
  ),
);
const text = fc.oneof(
  fc.string({ maxLength: 200, unit: "grapheme" }),
  fc.string({ maxLength: 200, unit: "binary" }),
  fc.array(piece, { maxLength: 60 }).map((pieces) => pieces.join("")),
  fc.array(piece, { maxLength: 60 }).map((pieces) => `x = ${pieces.join(" ")}`),
  fc
    .array(fc.tuple(fc.constantFrom("a", "b", "gases", "K", "α"), fc.array(piece, { maxLength: 12 })), {
      maxLength: 8,
    })
    .map((lines) => lines.map(([key, pieces]) => `${key} = ${pieces.join(" ")}`).join("\n")),
);

function expectInside(notes: readonly Note[], length: number): void {
  for (const { range, remedy, message } of notes) {
    expect(message).not.toMatch(/undefined|NaN|null|\[object/);
    for (const span of [range, remedy?.range])
      if (span) {
        expect(span.from).toBeGreaterThanOrEqual(0);
        expect(span.to).toBeGreaterThanOrEqual(span.from);
        expect(span.to).toBeLessThanOrEqual(length);
      }
  }
}

function expectNested(node: ValueNode, from: number, to: number): void {
  expect(node.range.from).toBeGreaterThanOrEqual(from);
  expect(node.range.to).toBeLessThanOrEqual(to);
}

describe("any text", () => {
  it("gives entries and notes with places inside it, and no number that is none", () => {
    fc.assert(
      fc.property(text, (cell) => {
        const { entries, notes } = parseEntries(cell);
        expectInside(notes, cell.length);
        for (const { line } of notes) expect(line).toBeGreaterThan(0);
        let end = 0;
        for (const entry of entries) {
          expect(entry.range.from).toBeGreaterThanOrEqual(end);
          end = entry.range.to;
          expect(end).toBeLessThanOrEqual(cell.length);
          expect(cell.slice(entry.keyRange.from, entry.keyRange.to)).toBe(entry.key);
          expectNested(entry.node, entry.range.from, entry.range.to);
          const isTold = notes.some((note) => note.entry === entry.key && note.level === "fault");
          if (entry.node.type === "broken") expect(isTold).toBe(true);

          const evaluated = evaluateExpression(entry.node, scope);
          expectInside(evaluated.notes, cell.length);
          if (evaluated.ok) {
            expect(Number.isFinite(evaluated.quantity.value)).toBe(true);
            for (const unitSystem of ["SI", "cgs"] as const)
              expect(understoodText(entry.node, evaluated.quantity, { unitSystem }) ?? "").not.toMatch(
                /undefined|NaN|Infinity/,
              );
          } else if (entry.node.type !== "broken") expect(evaluated.notes.length).toBeGreaterThan(0);
          for (const reading of [
            readTemperature(entry.node, scope),
            readEddy(entry.node, scope),
            readLevels(entry.node, scope),
            readGasList(entry.node, ["H", "CO2"], scope),
          ]) {
            expectInside(reading.notes, cell.length);
            if (!reading.ok && entry.node.type !== "broken") expect(reading.notes.length).toBeGreaterThan(0);
          }
        }
      }),
      { seed: 20, numRuns: 3000 },
    );
  });

  it("is read by the editor's parser to its end", () => {
    fc.assert(
      fc.property(text, (cell) => {
        expect(cellParser.parse(cell).length).toBe(cell.length);
      }),
      { seed: 21, numRuns: 500 },
    );
  });
});
