import type { CompletionContext, CompletionResult } from "@codemirror/autocomplete";
import { libraryResponse, suppliedResponse } from "../../../../shared/schemas/references";
import { api } from "../../../lib/api";

const inPin = /\bref\(\s*([A-Za-z]*[\w.]*)$/;
const inName = /\bref\(\s*([A-Z]{2,5}\d+\.\d+)\s*,\s*([\w.+]*)$/;

/** Within `ref(…)`: the current references, and behind the comma what the edition has. */
export async function completeReference(context: CompletionContext): Promise<CompletionResult | null> {
  const line = context.state.doc.lineAt(context.pos);
  const before = context.state.sliceDoc(line.from, context.pos);
  const name = inName.exec(before);
  if (name) return namesOf(name[1]!, context.pos - name[2]!.length);
  const pin = inPin.exec(before);
  return pin ? pinsFrom(context.pos - pin[1]!.length) : null;
}

/** Whether a place stands within `ref(…)`, where names of this notebook mean nothing. */
export function isInReference(context: CompletionContext): boolean {
  const line = context.state.doc.lineAt(context.pos);
  const before = context.state.sliceDoc(line.from, context.pos);
  return inPin.test(before) || inName.test(before);
}

async function pinsFrom(from: number): Promise<CompletionResult | null> {
  const library = await api.get("/references", libraryResponse).catch(() => []);
  if (library.length === 0) return null;
  const options = library.map(({ pin, title }) => ({ label: pin, detail: title, type: "constant" }));
  return { from, options, validFor: /^[\w.]*$/ };
}

async function namesOf(pin: string, from: number): Promise<CompletionResult | null> {
  const [reference] = await api
    .get(`/references/supplied?pins=${encodeURIComponent(pin)}`, suppliedResponse)
    .catch(() => []);
  if (!reference) return null;
  const bodies = Object.keys(reference.bodies).map((label) => ({ label, detail: "body", type: "class" }));
  const values = Object.entries(reference.values).map(([label, { unit = "" }]) => ({
    label,
    detail: unit === "1" ? "" : unit,
    type: "variable",
  }));
  return { from, options: [...bodies, ...values], validFor: /^[\w.+]*$/ };
}
