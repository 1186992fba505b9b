import { formatGas } from "./format";
import { plainText, type RichText } from "./richText";

/** A result as figures and tables speak of it. */
export interface ResultLabel {
  /** "leak.H.rate" */
  name: string;
  /** "rate of H"; the name as written for an entry of a values cell. */
  label: RichText;
  /** null where it is no result of one gas. */
  gas: string | null;
  /** "rate": what curves of one panel have in common. */
  quantity: RichText;
}

const isGas = (part: string | undefined): part is string =>
  part !== undefined && /^[A-Z][A-Za-z0-9]*$/.test(part);

/** "log10_rate" as log₁₀ rate; underscores are spaces. */
function words(path: readonly string[]): RichText {
  const text = path.join(" ").replace(/_/g, " ");
  return text.startsWith("log10 ") ? ["log", { sub: "10" }, ` ${text.slice(6)}`] : [text];
}

function labelOf(name: string): ResultLabel {
  const [, ...path] = name.split(".");
  if (path.length === 0) return { name, label: [{ code: name }], gas: null, quantity: [{ code: name }] };
  const [first, ...rest] = path;
  if (!isGas(first) || rest.length === 0)
    return { name, label: words(path), gas: null, quantity: words(path) };
  const quantity = words(rest);
  return { name, label: [...quantity, " of ", ...formatGas(first)], gas: first, quantity };
}

/** Labels of results that stand together: two that would read the same say of which cell they are. */
export function resultLabels(names: readonly string[]): ResultLabel[] {
  const labels = names.map(labelOf);
  const count = (text: string) => labels.filter(({ label }) => plainText(label) === text).length;
  return labels.map((each) => {
    if (count(plainText(each.label)) < 2) return each;
    const cell = each.name.split(".", 1)[0]!;
    return { ...each, label: [...each.label, " in ", { italic: cell }] };
  });
}
