import { EditorView, keymap } from "@codemirror/view";
import { Prec } from "@codemirror/state";
import CodeMirror, { type BasicSetupOptions } from "@uiw/react-codemirror";
import { useCallback, useEffect, useMemo, useState } from "react";
import type { Note, Understood } from "../../../../shared/notebook/result";
import { pageNonce } from "../../../lib/pageNonce";
import { entryCompletion, type CompletionSurroundings } from "../editor/entryCompletion";
import { entryLanguage } from "../editor/entryLanguage";
import { entryLayout } from "../editor/entryLayout";
import { entryNames, nameSurroundings, type NameSurroundings } from "../editor/entryNames";
import { entryReading, showReading } from "../editor/entryReading";
import type { CellCommands } from "./useCellCommands";

/** What the editor has of its own; the language, the marks and the keys of a cell come beside it. */
const setup: BasicSetupOptions = {
  lineNumbers: false,
  highlightActiveLineGutter: false,
  foldGutter: false,
  drawSelection: false,
  allowMultipleSelections: false,
  indentOnInput: false,
  syntaxHighlighting: false,
  rectangularSelection: false,
  highlightSelectionMatches: false,
  searchKeymap: false,
  foldKeymap: false,
  lintKeymap: false,
  bracketMatching: false,
};

interface EntriesEditorProps {
  cellId: string;
  /** Heard when the editor takes the focus: "Entries of column dayside". */
  label: string;
  text: string;
  /** The text that `understood` and `notes` speak of. */
  readText: string | undefined;
  understood: readonly Understood[];
  notes: readonly Note[];
  isEditable: boolean;
  names: NameSurroundings;
  completion: CompletionSurroundings;
  commands: CellCommands;
  /** A cell just inserted takes the focus. */
  autoFocus: boolean;
}

/** The entries of one cell, in an editor of their own. */
export function EntriesEditor({
  cellId,
  label,
  text,
  readText,
  understood,
  notes,
  isEditable,
  names,
  completion,
  commands,
  autoFocus,
}: EntriesEditorProps) {
  const [view, setView] = useState<EditorView | null>(null);
  const extensions = useMemo(
    () => [
      entryLanguage,
      EditorView.cspNonce.of(pageNonce),
      EditorView.lineWrapping,
      entryLayout,
      entryNames,
      entryReading,
      nameSurroundings.of(names),
      entryCompletion(completion),
      EditorView.contentAttributes.of({
        "aria-label": label,
        "aria-readonly": String(!isEditable),
        autocapitalize: "off",
        autocorrect: "off",
        spellcheck: "false",
      }),
      Prec.highest(keymap.of(cellKeys(cellId, commands))),
    ],
    [names, completion, label, isEditable, cellId, commands],
  );
  const handleChange = useCallback((value: string) => commands.write(cellId, value), [cellId, commands]);

  useEffect(
    function markReading() {
      if (view && readText !== undefined) {
        view.dispatch({ effects: showReading.of({ text: readText, understood, notes }) });
      }
    },
    [view, readText, understood, notes],
  );

  return (
    <CodeMirror
      className="entries"
      value={text}
      theme="none"
      basicSetup={setup}
      indentWithTab={false}
      extensions={extensions}
      onChange={handleChange}
      onCreateEditor={setView}
      readOnly={!isEditable}
      autoFocus={autoFocus}
    />
  );
}

/** Keys of a cell while it is written: moved with Alt and an arrow, left with Escape, so that Tab goes on. */
function cellKeys(cellId: string, commands: CellCommands) {
  const moving = (by: 1 | -1) => () => {
    commands.move(cellId, by);
    return true;
  };
  return [
    { key: "Alt-ArrowUp", run: moving(-1) },
    { key: "Alt-ArrowDown", run: moving(1) },
    {
      key: "Alt-Enter",
      run: () => {
        commands.openInsert(cellId);
        return true;
      },
    },
    {
      key: "Escape",
      run: (view: EditorView) => {
        // An open list of completions takes the first Escape.
        if (view.dom.querySelector(".cm-tooltip-autocomplete")) return false;
        commands.focusCell(cellId);
        return true;
      },
    },
  ];
}
