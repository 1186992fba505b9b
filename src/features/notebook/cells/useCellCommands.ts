import { useEffect, useRef, useState } from "react";
import { addHandbookCell } from "../../../../shared/notebook/addHandbookCell";
import type { CellKind, NotebookDocument } from "../../../../shared/notebook/document";
import type { DocumentEdit } from "../../../../shared/notebook/editDocument";
import type { HandbookCell } from "../../../../shared/notebook/handbookCells";
import type { TextRange } from "../../../../shared/notebook/result";
import { useNotify, type Notice } from "../../../ui/Notices";
import { cellTitle } from "./cellTitle";
import { newCell } from "./newCell";
import { renamingEdit } from "./renamingEdit";

interface Surroundings {
  document: NotebookDocument;
  edit: (edit: DocumentEdit, words?: string) => void;
  notify: (notice: Notice) => void;
}

/** What can be done to cells. The object stays the same while the page lives, so that no cell is drawn again for it. */
export function useCellCommands(document: NotebookDocument, edit: Surroundings["edit"]) {
  const notify = useNotify();
  const latest = useRef<Surroundings>({ document, edit, notify });
  const [newCellId, setNewCellId] = useState<string | null>(null);
  const [commands] = useState(() => createCellCommands(() => latest.current, setNewCellId));

  useEffect(function rememberLatest() {
    latest.current = { document, edit, notify };
  });

  return { commands, newCellId };
}

function createCellCommands(now: () => Surroundings, onNewCell: (id: string) => void) {
  const cellOf = (id: string) => now().document.cells.find((cell) => cell.id === id);
  const indexOf = (id: string) => now().document.cells.findIndex((cell) => cell.id === id);

  function moveTo(id: string, index: number): void {
    const cell = cellOf(id);
    if (!cell || index === indexOf(id) || index < 0 || index >= now().document.cells.length) return;
    const isWriting = window.document.activeElement?.closest(".cm-editor") instanceof HTMLElement;
    now().edit({ type: "moveCell", id, index }, `${cellTitle(cell)} moved`);
    keepInSight(id, isWriting);
  }

  return {
    write(id: string, text: string): void {
      const cell = cellOf(id);
      if (cell && cell.text !== text) now().edit({ type: "changeText", id, text });
    },
    /** Writes over a part of a cell's text. */
    replace(id: string, { from, to }: TextRange, replacement: string): void {
      const cell = cellOf(id);
      if (!cell || to > cell.text.length) return;
      now().edit({
        type: "changeText",
        id,
        text: cell.text.slice(0, from) + replacement + cell.text.slice(to),
      });
    },
    insert(kind: CellKind, index: number): void {
      const cell = newCell(kind, now().document, index);
      now().edit({ type: "insertCell", index, cell }, `${cellTitle(cell)} inserted`);
      onNewCell(cell.id);
    },
    /** Puts a row of the handbook in, written as a cell: the first of `choices` that the notebook has room for. */
    insertFromHandbook(choices: readonly HandbookCell[], index: number): void {
      const added = addHandbookCell(now().document, choices, crypto.randomUUID(), index);
      if (!added.ok) {
        now().notify({ state: "fault", text: added.message });
        return;
      }
      now().edit({ type: "insertCell", index, cell: added.cell }, `${cellTitle(added.cell)} inserted`);
      onNewCell(added.cell.id);
    },
    remove(id: string): void {
      const cell = cellOf(id);
      if (!cell) return;
      const index = indexOf(id);
      const words = `${cellTitle(cell)} removed`;
      now().edit({ type: "removeCell", id }, words);
      const putBack = () =>
        now().edit({ type: "insertCell", index: Math.min(index, now().document.cells.length), cell });
      now().notify({ text: words, action: { label: "Put back", run: putBack } });
    },
    rename(id: string, name: string): void {
      const cell = cellOf(id);
      if (!cell || cell.name === name) return;
      const { edit, mentions } = renamingEdit(now().document, id, name);
      now().edit(edit, `${cellTitle(cell)} renamed`);
      if (mentions > 0) {
        now().notify({ text: `${cellTitle(cell)} is now ${name}, in the cells that use it too.` });
      }
    },
    moveTo,
    /** One place up or down. */
    move: (id: string, by: 1 | -1): void => moveTo(id, indexOf(id) + by),
    focusCell: (id: string): void => cellElement(id)?.focus({ preventScroll: true }),
    /** Opens the menu of kinds under a cell. */
    openInsert(afterId: string): void {
      window.document.querySelector<HTMLElement>(`[data-insert-after="${CSS.escape(afterId)}"]`)?.click();
    },
  };
}

export type CellCommands = ReturnType<typeof createCellCommands>;

export const cellElement = (id: string): HTMLElement | null => document.getElementById(`cell-${id}`);

/** A moved element loses the focus, and may leave the window. */
function keepInSight(id: string, isWriting: boolean): void {
  requestAnimationFrame(() => {
    const cell = cellElement(id);
    const target = isWriting ? cell?.querySelector<HTMLElement>(".cm-content") : cell;
    target?.focus({ preventScroll: true });
    cell?.scrollIntoView({ block: "nearest" });
  });
}
