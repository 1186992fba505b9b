/** The text of `docs/validation.md`, from what the tests compared. */
import { type Agreement, isCompared, isRange, type Section, sections } from "./agreement";
import { citation } from "./sources";
import { testedLaws } from "./testedLaws";
import {
  collapse,
  type ToldAgreement,
  writeDeviation,
  writeNumber,
  writePublished,
  writeTolerance,
} from "./toldAgreement";

const headings: Record<Exclude<Section, "magnitude">, string> = {
  constants: "Constants",
  handbook: "Handbook",
  conversion: "Conversions",
  body: "Body",
  temperature: "Temperature",
  column: "Column",
  exobase: "Exobase",
  escape: "Thermal escape",
  coupling: "Escape and column together",
  corona: "Corona",
  limits: "Limits",
  loss: "Loss",
  nonthermal: "Nonthermal escape",
  spread: "Spread and sensitivity",
  numerics: "Special functions",
  notebook: "Through a notebook",
};

const introduction = `# Validation

What Tenuity computes beside numbers from outside: published values, tables, and the answers of other programs. This
page is written by the tests from the very numbers they compare (\`npm run validation\`); \`npm test\` fails where it is
out of date.

## How to read it

Each row is a check that a test asserts.

- **published** is the number from outside and **ours** what Tenuity finds, both in the unit given. Where a row stands
  for several numbers, it shows the one that comes nearest to its tolerance.
- **ours/published − 1** is how far they are apart, in parts: −3.2e-5 is 32 millionths too small. It is left out for a
  range.
- **within** is what the test allows. Tolerances follow from the outside number: its printed digits, its own stated
  spread, the rounding of a double.
- **source** is a key of the citations at the end. A number was _read_ in its source, unless the row says otherwise:
  _secondary_, read in a later work that cites the source; _from memory_, published, but written down from memory;
  _computed_, by another program or by hand, from a formula or inputs of the source.

Laws, limits and identities that need no outside number (conservation, closed forms, symmetry, monotonicity,
independence of steps) are tests as well; "Laws and limits" says which file holds them.
`;

const magnitudes = `## Orders of magnitude

Four real atmospheres, built from published inputs as notebooks (\`tests/fixtures/notebooks\`) and solved coupled, beside
what the literature has for them. Nothing is asserted here. The inputs are coarse, some are from memory, and the
published numbers come from models with chemistry, heating and measured profiles that these few lines do not have: the
ratios show what a first look is worth, good and bad alike.
`;

const lawsHead = `## Laws and limits

What must hold whatever the numbers are. Each of these is a test; the file is under \`tests/shared\`.
`;

/** Rows in the order of their files and tests, with the section of each. */
export interface SectionedAgreement {
  section: Section;
  row: Agreement;
}

export function validationPage(agreements: readonly SectionedAgreement[]): string {
  const parts = [introduction];
  for (const section of sections) {
    const rows = agreements.filter((one) => one.section === section).map(({ row }) => row);
    if (rows.length === 0) continue;
    if (section === "magnitude") parts.push(lawsHead, lawsTable(), magnitudes, magnitudeTable(rows));
    else parts.push(`## ${headings[section]}\n`, checkTable(rows));
  }
  const keys = [...new Set(agreements.map(({ row }) => row.source))].sort();
  parts.push(
    "## Sources\n\nVolumes and pages of those that the product itself does not cite are from memory.\n",
    keys.map((key) => `- **${key}**: ${citation(key)}`).join("\n"),
  );
  return `${parts.join("\n")}\n`;
}

function table(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const line = (cells: readonly string[]) =>
    `| ${cells.map((text) => text.replace(/\|/g, "\\|")).join(" | ")} |`;
  return `${[line(head), line(head.map(() => "---")), ...rows.map(line)].join("\n")}\n`;
}

const lawsTable = (): string =>
  table(
    ["law", "file"],
    testedLaws.map(({ law, file }) => [law, `\`${file}\``]),
  );

const unitOf = ({ unit }: Agreement): string => (unit === "1" ? "" : unit);

function sourceOf({ source, mark }: Agreement): string {
  if (mark === "published") return source;
  return `${source}, ${mark === "computed independently" ? "computed" : mark}`;
}

function checkTable(rows: readonly Agreement[]): string {
  return table(
    ["what", "numbers", "unit", "published", "ours", "ours/published − 1", "within", "source"],
    collapse(rows).map((told) => checkRow(told)),
  );
}

function checkRow({ worst, count }: ToldAgreement): string[] {
  return [
    worst.what,
    String(count),
    unitOf(worst),
    isRange(worst) || isCompared(worst) ? "" : writePublished(worst.published),
    writeNumber(worst.ours),
    isRange(worst) || isCompared(worst) ? "" : writeDeviation(worst),
    isCompared(worst) ? "" : writeTolerance(worst),
    sourceOf(worst),
  ];
}

function magnitudeTable(rows: readonly Agreement[]): string {
  const told = rows.filter(isCompared).map((row) => {
    const { published, ours, what, why } = row;
    const [lowest, highest] = typeof published === "number" ? [published, published] : published;
    const ratios = [ours / highest, ours / lowest].map((ratio) => writeNumber(ratio, 2));
    const written = [lowest, highest].map((value) => writeNumber(value));
    const both = (texts: string[]) => (lowest === highest ? texts[0] : texts.join(" to "));
    return [what, unitOf(row), both(written), writeNumber(ours, 3), both(ratios), sourceOf(row), why];
  });
  return table(["what", "unit", "published", "ours", "ours/published", "source", "why"], told);
}
