import type { SuppliedReference } from "../references";
import type { TextRange } from "../result";
import { fault } from "./notes";
import { refused, type Reading } from "./reading";
import type { CallNode, ValueNode } from "./syntax";

const pinForm = /^([A-Z]{2,5})([1-9]\d{0,5})\.([1-9]\d{0,5})$/;

/** "CAR4.2" as the group's code, the number and the edition; null where it has another form. */
export function partsOfPin(pin: string): { code: string; number: number; edition: number } | null {
  const parts = pinForm.exec(pin);
  return parts && { code: parts[1], number: Number(parts[2]), edition: Number(parts[3]) };
}

export const pinOf = ({ code, number, edition }: { code: string; number: number; edition: number }): string =>
  `${code}${number}.${edition}`;

/** What `ref(…)` names, and where that stands. */
export interface Pinned {
  reference: SuppliedReference;
  /** A cell or a result of the reference. */
  name: string;
  range: TextRange;
}

const form = "A reference is written ref(CAR4.2, name): the edition, then a result or a body of it.";

/** `ref(CAR4.2, name)`; whether the reference has such a name is for the caller. */
export function readPin(
  node: CallNode,
  referenceOf: (pin: string) => SuppliedReference | undefined,
): Reading<Pinned> {
  const [first, second, third] = node.items.map(({ value }) => value);
  const isPlain = node.items.every(({ name, label }) => name === null && label === null);
  if (!isPlain || third !== undefined || first?.type !== "name")
    return refused(fault("reference_form", node.range, form));
  const parts = partsOfPin(first.path);
  if (!parts) {
    const hasNoEdition = /^[A-Z]{2,5}[1-9]\d*$/.test(first.path);
    const message = hasNoEdition
      ? `*${first.path}* says no edition. Write ${first.path}.1 for the first, so that the numbers stay those.`
      : form;
    return refused(fault("reference_form", first.range, message));
  }
  if (second?.type !== "name") return refused(fault("reference_form", node.range, form));
  const reference = referenceOf(first.path);
  if (!reference) {
    const message = `There is no reference ${parts.code} ${parts.number}, edition ${parts.edition}, or you may not see it.`;
    return refused(fault("reference_unknown", first.range, message));
  }
  return { ok: true, value: { reference, name: second.path, range: second.range }, notes: [] };
}

/** Every pin within a node, with its place. */
export function pinsIn(node: ValueNode): { pin: string; range: TextRange }[] {
  switch (node.type) {
    case "call":
      if (node.name === "ref") {
        const first = node.items[0]?.value;
        return first?.type === "name" && partsOfPin(first.path) ? [{ pin: first.path, range: first.range }] : [];
      }
      return node.items.flatMap(({ value }) => pinsIn(value));
    case "list":
      return node.items.flatMap(({ value }) => pinsIn(value));
    case "measured":
    case "negative":
      return pinsIn(node.operand);
    case "sum":
      return node.terms.flatMap((term) => pinsIn(term.node));
    case "product":
      return node.factors.flatMap((factor) => pinsIn(factor.node));
    case "power":
      return [node.base, node.exponent].flatMap(pinsIn);
    case "uncertain":
      return [node.first, node.second].flatMap(pinsIn);
    case "variation":
      return [node.subject, node.first, node.last, node.steps].flatMap(pinsIn);
    case "number":
    case "name":
    case "broken":
      return [];
  }
}
