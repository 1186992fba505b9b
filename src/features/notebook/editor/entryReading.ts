import {
  StateEffect,
  StateField,
  type EditorState,
  type Extension,
  type Range,
  type Transaction,
} from "@codemirror/state";
import { Decoration, EditorView, type DecorationSet } from "@codemirror/view";
import type { Note, TextRange, Understood } from "../../../../shared/notebook/result";
import { NoteWidget } from "./NoteWidget";
import { UnderstoodWidget } from "./UnderstoodWidget";

/** How the text of a cell was read: shown only on the very text that was read. */
export interface EntryReading {
  text: string;
  understood: readonly Understood[];
  notes: readonly Note[];
}

export const showReading = StateEffect.define<EntryReading>();

/**
 * The value as understood after each entry, a line under what is wrong, and why under the entry. While newer text is
 * being computed the old marks move along with the characters they belong to; values on the changed lines go at once.
 */
export const entryReading: Extension = StateField.define<DecorationSet>({
  create: () => Decoration.none,
  update(marks, transaction) {
    let moved = transaction.docChanged ? forgetChanged(marks.map(transaction.changes), transaction) : marks;
    for (const effect of transaction.effects) {
      if (!effect.is(showReading) || effect.value.text !== transaction.state.doc.toString()) continue;
      moved = marksOf(transaction.state, effect.value);
    }
    return moved;
  },
  provide: (field) => EditorView.decorations.from(field),
});

/** Without the values of lines that were just changed: they spoke of what stood there before. */
function forgetChanged(marks: DecorationSet, { state, changes }: Transaction): DecorationSet {
  let kept = marks;
  changes.iterChangedRanges((_fromA, _toA, fromB, toB) => {
    kept = kept.update({
      filterFrom: state.doc.lineAt(fromB).from,
      filterTo: state.doc.lineAt(toB).to,
      filter: (_from, _to, mark) => !(mark.spec.widget instanceof UnderstoodWidget),
    });
  });
  return kept;
}

function marksOf(state: EditorState, { text, understood, notes }: EntryReading): DecorationSet {
  const marks: Range<Decoration>[] = [];
  const length = state.doc.length;
  for (const value of understood) {
    if (value.offset > length) continue;
    marks.push(Decoration.widget({ widget: new UnderstoodWidget(value.text), side: 1 }).range(value.offset));
  }
  for (const note of notes) {
    const end = noteEnd(state, note);
    if (end === null) continue;
    if (note.level !== "remark" && note.range && note.range.to <= length && isPointed(state, note.range)) {
      const underline = Decoration.mark({
        class: `entry-${note.level}`,
        attributes: { title: note.message },
      });
      marks.push(underline.range(note.range.from, note.range.to));
    }
    if (note.level === "remark") continue;
    marks.push(Decoration.widget({ widget: new NoteWidget(note, text), block: true, side: 2 }).range(end));
  }
  return Decoration.set(marks, true);
}

/** Whether a range points at something: a line under the whole of a long value would say nothing. */
function isPointed(state: EditorState, { from, to }: TextRange): boolean {
  const before = state.sliceDoc(state.doc.lineAt(from).from, from);
  return to > from && (to - from < 24 || !/=\s*$/.test(before));
}

/** End of the line that a note speaks of; null where it speaks of the whole cell. */
function noteEnd(state: EditorState, { range, line }: Note): number | null {
  if (range) return range.to > state.doc.length ? null : state.doc.lineAt(Math.max(range.from, range.to)).to;
  if (line === undefined || line < 1 || line > state.doc.lines) return null;
  return state.doc.line(line).to;
}
