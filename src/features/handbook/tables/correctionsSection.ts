import { jeansCorrections } from "../../../../shared/physics";
import type { HandbookSection } from "../handbookTable";

export const correctionsSection: HandbookSection = {
  id: "corrections",
  title: "Kinetic corrections",
  about: [
    "Published ratios of the actual to the Jeans flux: fast particles leave sooner than collisions replace them, and a gas that leaves alone drifts. None acts by itself; an ",
    { code: "escape" },
    " cell takes one as ",
    { code: "correction = H: 0.72" },
    ".",
  ],
  tables: [
    {
      id: "corrections",
      caption: "Ratios to the Jeans flux",
      rowHead: "For",
      columns: [
        { key: "low", head: ["Lowest"], unit: "1", digits: 3 },
        { key: "high", head: ["Highest"], unit: "1", digits: 3 },
      ],
      rows: jeansCorrections.map(({ gas, formula, low, high, provenance }) => ({
        key: gas,
        name: gas,
        head: [gas],
        words: formula ?? "Jeans escape",
        values: { low: { value: low }, high: { value: high } },
        sources: [provenance],
      })),
    },
  ],
};
