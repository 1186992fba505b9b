import { DropdownMenu } from "radix-ui";
import { memo } from "react";
import { cellKinds, type CellKind } from "../../../../shared/notebook/document";
import { cellSchemas } from "../../../../shared/notebook/cellSchemas";
import type { CellCommands } from "./useCellCommands";

/** What one does with the kinds, in the order of the menu. */
const groups = [...new Set(cellKinds.map((kind) => cellSchemas[kind].group))].map((words) => ({
  words,
  kinds: cellKinds.filter((kind: CellKind) => cellSchemas[kind].group === words),
}));

interface InsertCellProps {
  /** Place of the new cell. */
  index: number;
  /** Id of the cell above; null at the top. */
  afterId: string | null;
  /** Where it stands, in words: "after Column dayside". */
  place: string;
  /** At the end of the notebook the caret has words beside it. */
  isLast: boolean;
  commands: CellCommands;
}

/** A proof-reader's caret between two cells, and the menu of kinds that hangs from it. */
export const InsertCell = memo(function InsertCell({
  index,
  afterId,
  place,
  isLast,
  commands,
}: InsertCellProps) {
  return (
    <div className="insert" data-last={isLast || undefined} data-print="never">
      <DropdownMenu.Root modal={false}>
        <DropdownMenu.Trigger
          className="insert-caret"
          data-insert-after={afterId ?? ""}
          aria-label={`Insert a cell ${place}`}
        >
          <svg
            width="18"
            height="12"
            viewBox="0 0 18 12"
            fill="none"
            stroke="currentColor"
            strokeWidth="1.5"
            aria-hidden="true"
          >
            <path d="M2 11L9 2l7 9" />
          </svg>
          <span className="insert-words" aria-hidden="true">
            Insert a cell
          </span>
        </DropdownMenu.Trigger>
        <DropdownMenu.Portal>
          <DropdownMenu.Content
            className="insert-menu"
            align="start"
            sideOffset={6}
            collisionPadding={18}
            loop
          >
            {groups.map(({ words, kinds }) => (
              <DropdownMenu.Group key={words} className="insert-group">
                <DropdownMenu.Label className="insert-group-words">{words}</DropdownMenu.Label>
                <div>
                  {kinds.map((kind) => (
                    <DropdownMenu.Item
                      key={kind}
                      className="insert-kind"
                      textValue={kind}
                      onSelect={() => commands.insert(kind, index)}
                    >
                      <b>{kind}</b>
                      <span>{cellSchemas[kind].description}</span>
                    </DropdownMenu.Item>
                  ))}
                </div>
              </DropdownMenu.Group>
            ))}
          </DropdownMenu.Content>
        </DropdownMenu.Portal>
      </DropdownMenu.Root>
    </div>
  );
});
