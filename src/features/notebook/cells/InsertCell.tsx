import { DropdownMenu } from "radix-ui";
import { lazy, memo, Suspense, useRef, useState } from "react";
import { cellSchemas } from "../../../../shared/notebook/cellSchemas";
import { cellKinds, type CellKind } from "../../../../shared/notebook/document";
import type { CellCommands } from "./useCellCommands";

/** What one does with the kinds, in the order of the menu. */
const groups = [...new Set(cellKinds.map((kind) => cellSchemas[kind].group))].map((words) => ({
  words,
  kinds: cellKinds.filter((kind: CellKind) => cellSchemas[kind].group === words),
}));

const HandbookChooser = lazy(() =>
  import("./HandbookChooser").then((file) => ({ default: file.HandbookChooser })),
);

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

/**
 * A proof-reader's caret between two cells, and the menu of kinds that hangs from it. The menu is made only while it
 * is open: each made one listens to every key on the page, and there is one caret a cell.
 */
export const InsertCell = memo(function InsertCell({
  index,
  afterId,
  place,
  isLast,
  commands,
}: InsertCellProps) {
  const [open, setOpen] = useState<"menu" | "handbook" | null>(null);
  const caret = useRef<HTMLButtonElement>(null);

  const handleClose = () => {
    setOpen(null);
    requestAnimationFrame(() => {
      // A cell just inserted has taken the focus to itself.
      if (document.activeElement === document.body) caret.current?.focus({ preventScroll: true });
    });
  };

  return (
    <div className="insert" data-last={isLast || undefined} data-print="never">
      {open === "menu" ? (
        <KindMenu
          place={place}
          onClose={handleClose}
          onKind={(kind) => commands.insert(kind, index)}
          onHandbook={() => setOpen("handbook")}
        />
      ) : (
        <button
          ref={caret}
          type="button"
          className="insert-caret"
          data-insert-after={afterId ?? ""}
          aria-label={`Insert a cell ${place}`}
          aria-haspopup="menu"
          aria-expanded={false}
          onClick={() => setOpen("menu")}
        >
          <CaretFace />
        </button>
      )}
      {open === "handbook" && (
        <Suspense>
          <HandbookChooser
            onClose={handleClose}
            onChoose={(choices) => {
              commands.insertFromHandbook(choices, index);
              handleClose();
            }}
          />
        </Suspense>
      )}
    </div>
  );
});

interface KindMenuProps {
  place: string;
  onClose: () => void;
  onKind: (kind: CellKind) => void;
  onHandbook: () => void;
}

function KindMenu({ place, onClose, onKind, onHandbook }: KindMenuProps) {
  const hasMovedOn = useRef(false);
  return (
    <DropdownMenu.Root modal={false} open onOpenChange={(open) => open || hasMovedOn.current || onClose()}>
      <DropdownMenu.Trigger className="insert-caret" aria-label={`Insert a cell ${place}`}>
        <CaretFace />
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          className="insert-menu"
          align="start"
          sideOffset={6}
          collisionPadding={18}
          loop
          onCloseAutoFocus={(event) => event.preventDefault()}
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
                    onSelect={() => onKind(kind)}
                  >
                    <b>{kind}</b>
                    <span>{cellSchemas[kind].description}</span>
                  </DropdownMenu.Item>
                ))}
              </div>
            </DropdownMenu.Group>
          ))}
          <DropdownMenu.Group className="insert-group">
            <DropdownMenu.Label className="insert-group-words">take over</DropdownMenu.Label>
            <DropdownMenu.Item
              className="insert-kind"
              textValue="handbook"
              onSelect={() => {
                // The menu closes after this; what takes its place must not be closed with it.
                hasMovedOn.current = true;
                onHandbook();
              }}
            >
              <b>handbook</b>
              <span>a body, gas, pair or constant, with its sources</span>
            </DropdownMenu.Item>
          </DropdownMenu.Group>
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

function CaretFace() {
  return (
    <>
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
    </>
  );
}
