import { syntaxTree } from "@codemirror/language";
import { Prec, RangeSetBuilder, type EditorState, type Extension } from "@codemirror/state";
import { Decoration, EditorView, ViewPlugin, type DecorationSet, type ViewUpdate } from "@codemirror/view";

interface EntryStart {
  lineFrom: number;
  /** Where `=` stands. */
  equals: number;
}

/** Past this the cell is laid out as it is typed: walking it at each key would be felt. */
const longest = 60_000;
/** Names longer than this don't push the whole cell to the right. */
const widestName = 32;

const equalsSign = Decoration.mark({ class: "entry-equals" });

/**
 * Names padded to the longest in the cell, so that the signs stand in line, and a hanging indent for what runs over
 * the line. Only looks change; the text stays as it was typed.
 */
const plugin = ViewPlugin.fromClass(
  class {
    decorations: DecorationSet;

    constructor(view: EditorView) {
      this.decorations = layOut(view.state);
    }

    update(update: ViewUpdate): void {
      if (update.docChanged || syntaxTree(update.startState) !== syntaxTree(update.state)) {
        this.decorations = layOut(update.state);
      }
    }
  },
  { decorations: ({ decorations }) => decorations },
);

/** Lowest, so that a name stays one piece with the marks inside it. */
export const entryLayout: Extension = Prec.lowest(plugin);

function layOut(state: EditorState): DecorationSet {
  const starts = state.doc.length > longest ? [] : entryStarts(state);
  const widths = starts
    .map(({ lineFrom, equals }) => equals - lineFrom)
    .filter((width) => width <= widestName);
  const column = Math.max(1, ...widths);
  const line = Decoration.line({
    attributes: { style: `--hang:${column + 2}ch` },
    class: "entry-line",
  });
  const name = Decoration.mark({ attributes: { style: `min-width:${column}ch` }, class: "entry-name" });
  const builder = new RangeSetBuilder<Decoration>();
  for (const { lineFrom, equals } of starts) {
    builder.add(lineFrom, lineFrom, line);
    if (equals > lineFrom) builder.add(lineFrom, equals, name);
    builder.add(equals, equals + 1, equalsSign);
  }
  return builder.finish();
}

function entryStarts(state: EditorState): EntryStart[] {
  const starts: EntryStart[] = [];
  for (let node = syntaxTree(state).topNode.firstChild; node; node = node.nextSibling) {
    if (node.name !== "Entry") continue;
    const key = node.getChild("Key");
    if (!key) continue;
    const { from: lineFrom, to: lineTo } = state.doc.lineAt(key.from);
    const equals = state.sliceDoc(key.to, lineTo).indexOf("=");
    if (equals < 0 || state.sliceDoc(lineFrom, key.from).trim() !== "") continue;
    starts.push({ lineFrom, equals: key.to + equals });
  }
  return starts;
}
