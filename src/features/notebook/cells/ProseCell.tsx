import { EditorView, keymap } from "@codemirror/view";
import { Prec } from "@codemirror/state";
import CodeMirror, { type BasicSetupOptions } from "@uiw/react-codemirror";
import { useCallback, useMemo, useState } from "react";
import type { Cell } from "../../../../shared/notebook/document";
import { pageNonce } from "../../../lib/pageNonce";
import { TextButton } from "../../../ui/TextButton";
import { CellThreadMarks, CommentWord } from "../comments/CellThreadMarks";
import { MoveHandle } from "./CellHead";
import { ProseText } from "./ProseText";
import { cellElement, type CellCommands } from "./useCellCommands";

const setup: BasicSetupOptions = {
  lineNumbers: false,
  highlightActiveLineGutter: false,
  highlightActiveLine: false,
  foldGutter: false,
  drawSelection: false,
  allowMultipleSelections: false,
  indentOnInput: false,
  syntaxHighlighting: false,
  bracketMatching: false,
  closeBrackets: false,
  autocompletion: false,
  rectangularSelection: false,
  highlightSelectionMatches: false,
  searchKeymap: false,
  foldKeymap: false,
  lintKeymap: false,
  completionKeymap: false,
};

interface ProseCellProps {
  cell: Cell;
  isEditable: boolean;
  isNew: boolean;
  commands: CellCommands;
  onDragStart: (event: React.PointerEvent) => void;
}

/** Prose reads as an article; pressed, or with Enter, it is written as Markdown, until one goes elsewhere. */
export function ProseCell({ cell, isEditable, isNew, commands, onDragStart }: ProseCellProps) {
  const [isWriting, setWriting] = useState(isEditable && isNew);
  const { id } = cell;
  const extensions = useMemo(
    () => [
      EditorView.cspNonce.of(pageNonce),
      EditorView.lineWrapping,
      EditorView.contentAttributes.of({
        "aria-label": "Prose, in Markdown",
        "aria-multiline": "true",
        spellcheck: "true",
      }),
      Prec.highest(
        keymap.of([
          { key: "Alt-ArrowUp", run: () => (commands.move(id, -1), true) },
          { key: "Alt-ArrowDown", run: () => (commands.move(id, 1), true) },
          { key: "Alt-Enter", run: () => (commands.openInsert(id), true) },
          { key: "Escape", run: () => (commands.focusCell(id), true) },
        ]),
      ),
    ],
    [id, commands],
  );
  const handleChange = useCallback((text: string) => commands.write(id, text), [id, commands]);

  if (isWriting) {
    return (
      <div
        className="prose-writing"
        onBlur={(event) => {
          if (!event.currentTarget.contains(event.relatedTarget) && document.hasFocus()) setWriting(false);
        }}
      >
        <CodeMirror
          className="prose-editor"
          value={cell.text}
          theme="none"
          basicSetup={setup}
          indentWithTab={false}
          extensions={extensions}
          onChange={handleChange}
          placeholder="Text in Markdown; formulas in TeX between dollar signs"
          autoFocus
        />
      </div>
    );
  }

  const write = () => {
    setWriting(true);
    cellElement(id)?.focus({ preventScroll: true });
  };
  return (
    <div className="prose-reading" data-editable={isEditable || undefined}>
      {isEditable && <MoveHandle onDragStart={onDragStart} />}
      {/* A shortcut for the pointer; by key the same is the word below, or Enter on the cell. */}
      <div onClick={isEditable ? (event) => isPlainPress(event) && write() : undefined}>
        {cell.text.trim() === "" ? (
          <p className="text-ink3">{isEditable ? "Nothing written yet." : ""}</p>
        ) : (
          <ProseText text={cell.text} />
        )}
      </div>
      <CellThreadMarks cell={cell} />
      <span className="prose-acts" data-print="never">
        <CommentWord cell={cell} />
        {isEditable && (
          <>
            <TextButton data-write onClick={write}>
              write
            </TextButton>
            <TextButton onClick={() => commands.remove(id)}>remove</TextButton>
          </>
        )}
      </span>
    </div>
  );
}

/** Not on a link, and not the end of a selection. */
function isPlainPress(event: React.MouseEvent): boolean {
  const isLink = (event.target as HTMLElement).closest("a") !== null;
  return !isLink && (window.getSelection()?.isCollapsed ?? true);
}
