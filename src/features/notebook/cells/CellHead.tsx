import { useEffect, useRef, useState } from "react";
import { documentLimits, type Cell } from "../../../../shared/notebook/document";
import { formatCount } from "../../../lib/format";
import { Menu, MenuItem, MenuRule } from "../../../ui/Menu";
import { StateWord } from "../../../ui/StateMark";
import { TextButton } from "../../../ui/TextButton";
import { CellThreadMarks, CommentWord } from "../comments/CellThreadMarks";
import { cellTitle } from "./cellTitle";
import type { CellCommands } from "./useCellCommands";
import type { WorstNotes } from "./worstNotes";

interface CellHeadProps {
  cell: Cell;
  titleId: string;
  worst: WorstNotes | null;
  isEditable: boolean;
  commands: CellCommands;
  onDragStart: (event: React.PointerEvent) => void;
}

/** Over a cell: its kind, its name, what is wrong with it, and what can be done to it. */
export function CellHead({ cell, titleId, worst, isEditable, commands, onDragStart }: CellHeadProps) {
  const [isRenaming, setRenaming] = useState(cell.kind === "gas" && cell.name === "" && isEditable);

  return (
    <div className="cell-head head-line">
      {isEditable && <MoveHandle onDragStart={onDragStart} />}
      <span className="type-kind text-ink2">{cell.kind}</span>
      <h2 id={titleId} className="type-cell-name">
        <span className="visually-hidden">{`${cell.kind} `}</span>
        {isRenaming ? (
          <NameField
            cell={cell}
            onDone={(name) => {
              setRenaming(false);
              if (name !== null) commands.rename(cell.id, name);
            }}
          />
        ) : isEditable ? (
          <button type="button" className="cell-name" title="Rename" onClick={() => setRenaming(true)}>
            {cell.name || <span className="text-ink3">unnamed</span>}
          </button>
        ) : (
          cell.name
        )}
      </h2>
      <CellThreadMarks cell={cell} />
      <span className="flex-1" />
      {worst && <StateWord state={worst.level}>{formatCount(worst.count, worst.level)}</StateWord>}
      <CommentWord cell={cell} className="cell-comment" />
      {isEditable && (
        <Menu
          align="end"
          trigger={
            <TextButton className="cell-more" data-print="never" aria-label={`More for ${cellTitle(cell)}`}>
              more
            </TextButton>
          }
        >
          <MenuItem onSelect={() => setRenaming(true)}>Rename</MenuItem>
          <MenuItem onSelect={() => commands.move(cell.id, -1)}>Move up</MenuItem>
          <MenuItem onSelect={() => commands.move(cell.id, 1)}>Move down</MenuItem>
          <MenuRule />
          <MenuItem onSelect={() => commands.remove(cell.id)}>Remove</MenuItem>
        </Menu>
      )}
    </div>
  );
}

/** Where a cell is taken to be moved; by key it is moved with Alt and an arrow, or from its menu. */
export function MoveHandle({ onDragStart }: { onDragStart: (event: React.PointerEvent) => void }) {
  return (
    <span
      className="cell-handle"
      aria-hidden="true"
      title="Move"
      onPointerDown={onDragStart}
      data-print="never"
    >
      <svg width="12" height="24" viewBox="0 0 12 24" fill="none" stroke="currentColor" strokeWidth="1.3">
        <path d="M6 1.5v21M2 5.5l4-4 4 4M2 18.5l4 4 4-4" />
      </svg>
    </span>
  );
}

function NameField({ cell, onDone }: { cell: Cell; onDone: (name: string | null) => void }) {
  const [name, setName] = useState(cell.name);
  const input = useRef<HTMLInputElement>(null);
  const isDone = useRef(false);

  useEffect(function beginWriting() {
    // A menu that closes gives the focus back to its word first.
    const frame = requestAnimationFrame(() => input.current?.select());
    return () => cancelAnimationFrame(frame);
  }, []);

  const finish = (given: string | null) => {
    if (isDone.current) return;
    isDone.current = true;
    onDone(given);
  };

  return (
    <input
      ref={input}
      className="cell-name-field"
      aria-label={`Name of this ${cell.kind} cell`}
      placeholder={cell.kind === "gas" ? "formula" : "name"}
      value={name}
      maxLength={documentLimits.nameLength}
      size={Math.max(8, name.length + 1)}
      spellCheck={false}
      autoCapitalize="off"
      onChange={(event) => setName(event.target.value)}
      onBlur={() => finish(name.trim())}
      onKeyDown={(event) => {
        if (event.key === "Enter") finish(name.trim());
        if (event.key === "Escape") finish(null);
        event.stopPropagation();
      }}
    />
  );
}
