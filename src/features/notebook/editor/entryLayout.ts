import { syntaxTree } from "@codemirror/language";
import { Prec, type EditorState, type Extension, type Range } from "@codemirror/state";
import type { EditorView } from "@codemirror/view";
import { Decoration, ViewPlugin, type DecorationSet, type ViewUpdate } from "@codemirror/view";

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
const remarkGap = Decoration.mark({ class: "entry-gap" });
/** The sign of a remark is not left alone at the end of a line. */
const remarkStart = Decoration.mark({ class: "entry-remark-start" });

/**
 * Names padded to the longest in the cell, so that the signs stand in line, a hanging indent for what runs over the
 * line, and one space before a remark on lines that are not being written. Only looks change; the text stays as it was
 * typed.
 */
const plugin = ViewPlugin.fromClass(
  class {
    decorations: DecorationSet;

    constructor(view: EditorView) {
      this.decorations = layOut(view);
    }

    update(update: ViewUpdate): void {
      const isReread = syntaxTree(update.startState) !== syntaxTree(update.state);
      if (update.docChanged || isReread || update.selectionSet || update.focusChanged) {
        this.decorations = layOut(update.view);
      }
    }
  },
  { decorations: ({ decorations }) => decorations },
);

/** Lowest, so that a name stays one piece with the marks inside it. */
export const entryLayout: Extension = Prec.lowest(plugin);

function layOut(view: EditorView): DecorationSet {
  const { state } = view;
  if (state.doc.length > longest) return Decoration.none;
  const starts = entryStarts(state);
  const widths = starts
    .map(({ lineFrom, equals }) => equals - lineFrom)
    .filter((width) => width <= widestName);
  const column = Math.max(1, ...widths);
  const line = Decoration.line({ attributes: { style: `--hang:${column + 2}ch` }, class: "entry-line" });
  const name = Decoration.mark({ attributes: { style: `min-width:${column}ch` }, class: "entry-name" });

  const marks: Range<Decoration>[] = remarkMarks(state, view.hasFocus);
  for (const { lineFrom, equals } of starts) {
    marks.push(line.range(lineFrom), equalsSign.range(equals, equals + 1));
    if (equals > lineFrom) marks.push(name.range(lineFrom, equals));
  }
  return Decoration.set(marks, true);
}

function entryStarts(state: EditorState): EntryStart[] {
  const starts: EntryStart[] = [];
  for (const node of syntaxTree(state).topNode.getChildren("Entry")) {
    const key = node.getChild("Key");
    if (!key) continue;
    const { from: lineFrom, to: lineTo } = state.doc.lineAt(key.from);
    const equals = state.sliceDoc(key.to, lineTo).indexOf("=");
    if (equals < 0 || state.sliceDoc(lineFrom, key.from).trim() !== "") continue;
    starts.push({ lineFrom, equals: key.to + equals });
  }
  return starts;
}

/** How remarks begin, and the spaces before them beyond the last, which the value as understood has pushed out of any order. */
function remarkMarks(state: EditorState, isWritten: boolean): Range<Decoration>[] {
  const marks: Range<Decoration>[] = [];
  const activeLine = isWritten ? state.doc.lineAt(state.selection.main.head).number : -1;
  syntaxTree(state).iterate({
    enter(node) {
      if (node.name !== "Remark") return;
      const line = state.doc.lineAt(node.from);
      const end = line.from + state.sliceDoc(line.from, node.from).trimEnd().length;
      if (end > line.from && node.from - end > 1 && line.number !== activeLine) {
        marks.push(remarkGap.range(end, node.from - 1));
      }
      const [beginning = "#"] = /^#+\s*\S{0,24}/.exec(state.sliceDoc(node.from, node.to)) ?? [];
      marks.push(remarkStart.range(node.from, node.from + beginning.length));
    },
  });
  return marks;
}
