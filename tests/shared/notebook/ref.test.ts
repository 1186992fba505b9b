import { describe, expect, it } from "vitest";
import type { NotebookDocument } from "../../../shared/notebook/document";
import { completeNotebook } from "../../../shared/notebook/completeNotebook";
import { evaluateNotebook } from "../../../shared/notebook/evaluateNotebook";
import { publishedBodies, publishedValues } from "../../../shared/notebook/publishedParts";
import { pinsOf, type SuppliedReference } from "../../../shared/notebook/references";

function notebook(cells: [kind: NotebookDocument["cells"][number]["kind"], name: string, text: string][]): NotebookDocument {
  return {
    format: 1,
    title: "A notebook",
    unitSystem: "SI",
    headline: [],
    authors: [],
    cells: cells.map(([kind, name, text], index) => ({ id: `c${index}`, kind, name, text })),
  };
}

const body = "mass = 3e24 kg\nradius = 5000 km";
const column = (of: string) =>
  `body = ${of}\nbase = 100 km\npressure = 1 Pa\ngases = N2: rest\ntemperature = ref(CAR4.2, T_quiet)`;
const source = notebook([
  ["values", "", "T_quiet = 240 K"],
  ["body", "ilmara", body],
]);

const reference: SuppliedReference = {
  pin: "CAR4.2",
  values: publishedValues(evaluateNotebook(source).evaluation.cells.map(({ result }) => result)),
  bodies: publishedBodies(source, new Map()),
  newest: 2,
  withdrawn: null,
};
const supplied = (change: Partial<SuppliedReference> = {}) => new Map([["CAR4.2", { ...reference, ...change }]]);

const evaluated = (document: NotebookDocument, references = supplied()) =>
  evaluateNotebook(document, undefined, undefined, references).evaluation.cells.map(({ result }) => result);

describe("ref(CAR4.2, name)", () => {
  it("takes a result, with its unit, into arithmetic", () => {
    const [cell] = evaluated(notebook([["values", "", "T = 2 * ref(CAR4.2, T_quiet) + 1 K"]]));
    expect(cell!.values.T).toEqual({ value: 481, unit: "K" });
    expect(cell!.notes).toEqual([]);
  });

  it("as the body of a column gives what the body's own entries give, to the last bit", () => {
    const [own] = evaluated(notebook([["body", "ilmara", body], ["column", "air", column("ilmara")]])).slice(1);
    const [pinned] = evaluated(notebook([["column", "air", column("ref(CAR4.2, ilmara)")]]));
    expect(pinned!.notes.filter(({ level }) => level === "fault")).toEqual([]);
    expect(pinned!.values).toEqual(own!.values);
    expect(pinned!.profiles).toEqual(own!.profiles);
  });

  it.each([
    ["ref(CAR4.3, T_quiet)", "reference_unknown", /no reference CAR 4, edition 3, or you may not see it/],
    ["ref(CAR4.2, T_quite)", "reference_result", /no result \*T_quite\*. The nearest is \*T_quiet\*/],
    ["ref(CAR4, T_quiet)", "reference_form", /says no edition/],
    ["ref(CAR4.2)", "reference_form", /ref\(CAR4\.2, name\)/],
    ["ref(CAR4.2, T_quiet, 3)", "reference_form", /ref\(CAR4\.2, name\)/],
    ["1 m + ref(CAR4.2, T_quiet)", "dimension", /Only like can be added/],
  ])("%s is a fault", (text, code, words) => {
    const [cell] = evaluated(notebook([["values", "", `T = ${text}`]]));
    expect(cell!.status).toBe("fault");
    expect(cell!.notes[0]!.code).toBe(code);
    expect(cell!.notes[0]!.message).toMatch(words);
  });

  it("a body that is not in it is a fault with the nearest", () => {
    const [cell] = evaluated(notebook([["column", "air", column("ref(CAR4.2, ilmera)")]]));
    expect(cell!.notes[0]).toMatchObject({ code: "reference_body", remedy: { replacement: "ilmara" } });
  });

  it("tells of a newer edition as a remark, and of a withdrawal as a caution; the numbers stay", () => {
    const document = notebook([["values", "", "T = ref(CAR4.2, T_quiet)"]]);
    const [newer] = evaluated(document, supplied({ newest: 3 }));
    expect(newer).toMatchObject({ status: "fine", values: { T: { value: 240 } } });
    expect(newer!.notes).toMatchObject([{ level: "remark", code: "newer_edition", remedy: { replacement: "CAR4.3" } }]);
    const [withdrawn] = evaluated(document, supplied({ withdrawn: "Wrong mass" }));
    expect(withdrawn!.notes).toMatchObject([{ level: "caution", message: "CAR 4, edition 2 was withdrawn: Wrong mass." }]);
  });

  it("is answered anew when the reference arrives after a first evaluation", () => {
    const document = notebook([["values", "", "T = ref(CAR4.2, T_quiet)"]]);
    const first = evaluateNotebook(document);
    expect(first.evaluation.cells[0]!.result.status).toBe("fault");
    const second = evaluateNotebook(document, first.memory, undefined, supplied());
    expect(second.evaluation.cells[0]!.result.values.T).toEqual({ value: 240, unit: "K" });
  });

  it("acts in sweeps and spreads, and its names are not those of the notebook", () => {
    const document = notebook([
      ["values", "", "T_quiet = 300 ± 10 K\nshift = 5 K\nT = ref(CAR4.2, T_quiet) + shift"],
      ["sweep", "by", "vary = shift from 0 K to 10 K in 2 steps\nwatch = T"],
    ]);
    const cell = completeNotebook(document, () => true, supplied()).cells[1]!.result;
    expect(cell.notes.filter(({ level }) => level === "fault")).toEqual([]);
    expect(JSON.stringify(cell.tables)).toContain("250");
  });

  it("every pin of a notebook is found once", () => {
    const document = notebook([
      ["values", "", "a = ref(CAR4.2, x) * ref(NIR1.1, y)\nb = max(ref(CAR4.2, z), 1)\nc = 1 # ref(CAR9.9, w)"],
      ["prose", "", "ref(CAR8.1, x)"],
    ]);
    expect(pinsOf(document)).toEqual(["CAR4.2", "NIR1.1"]);
  });
});
