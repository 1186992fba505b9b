import type { Note } from "../result";
import { nearestName } from "./nearestName";
import { changeTo, fault, inWords } from "./notes";
import type { Reading } from "./reading";
import type { CallNode, ValueNode } from "./syntax";

export interface ArgumentForm {
  name: string;
  isNeeded: boolean;
  /** As in "base = 140 K". */
  example: string;
}

/** Named arguments of a form such as `bates(…)`. Every fault of the call is told at once. */
export function readArguments(
  call: CallNode,
  forms: readonly ArgumentForm[],
): Reading<Map<string, ValueNode>> {
  const notes: Note[] = [];
  const found = new Map<string, ValueNode>();
  const names = forms.map(({ name }) => name);
  for (const { name, label, value, range } of call.items) {
    if (name === null || label !== null) {
      const message = `Each argument of *${call.name}* has its name: ${forms[0].name} = ${forms[0].example}.`;
      if (value.type !== "broken") notes.push(fault("argument", range, message));
      continue;
    }
    if (!names.includes(name.text)) {
      const nearest = nearestName(
        name.text,
        names.filter((candidate) => !found.has(candidate)),
      );
      notes.push(
        nearest === undefined
          ? fault(
              "argument",
              name.range,
              `*${call.name}* has no argument *${name.text}*. It has ${inWords(names, "and")}.`,
            )
          : fault(
              "argument",
              name.range,
              `*${call.name}* has no argument *${name.text}*. The nearest is *${nearest}*.`,
              changeTo(name.range, nearest),
            ),
      );
      continue;
    }
    if (found.has(name.text)) {
      notes.push(fault("argument", name.range, `*${name.text}* stands twice in *${call.name}*. Keep one.`));
      continue;
    }
    found.set(name.text, value);
  }
  // A misspelt argument is told by itself; that it is missing too would say the same twice.
  const isAllKnown = notes.length === 0;
  for (const { name, isNeeded, example } of forms)
    if (isNeeded && !found.has(name) && isAllKnown)
      notes.push(fault("argument", call.nameRange, `*${call.name}* needs *${name}*: ${name} = ${example}.`));
  return notes.length > 0 ? { ok: false, notes } : { ok: true, value: found, notes };
}
