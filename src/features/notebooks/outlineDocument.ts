import type { Cell, NotebookDocument } from "../../../shared/notebook/document";

type OutlineCell = Pick<Cell, "kind" | "name" | "text">;

/** A body, the air over it and what escapes: the shortest notebook that answers, with numbers to be replaced. */
const outline: readonly OutlineCell[] = [
  {
    kind: "prose",
    name: "intro",
    text: "What is asked here, and where the numbers come from. Replace what follows by your own; results change as you write.",
  },
  {
    kind: "body",
    name: "planet",
    text: [
      "mass   = 0.41 earth_mass    # replace: source",
      "radius = 4943 km            # replace: source",
    ].join("\n"),
  },
  {
    kind: "column",
    name: "air",
    text: [
      "body           = planet",
      "base           = 80 km",
      "number_density = 3e20 /m^3",
      "gases          = N2: rest, O: 2 %, H: 0.2 ppm",
      "temperature    = bates(base = 150 K, exosphere = 400 K, shape = 0.03 /km)",
      "eddy           = 1e6 cm^2/s",
    ].join("\n"),
  },
  { kind: "escape", name: "leak", text: "column = air" },
];

/** A document to begin from, every cell with an id of its own. */
export function outlineDocument(title: string, newId: () => string): NotebookDocument {
  return {
    format: 1,
    title,
    unitSystem: "SI",
    headline: [],
    authors: [],
    cells: outline.map((cell) => ({ id: newId(), ...cell })),
  };
}
