import { Dialog } from "../../../ui/Dialog";

const keys: readonly (readonly [string, string])[] = [
  ["Enter", "from a cell into its text"],
  ["Escape", "from the text back to its cell; Tab then goes on"],
  ["Alt ↑, Alt ↓", "move the cell"],
  ["Alt Enter", "insert a cell below"],
  ["Delete", "remove the cell one stands on"],
  [
    "Ctrl Z, Ctrl Shift Z",
    "take back, do again: in a text what was written, elsewhere what was done to cells",
  ],
  ["Enter, arrows", "on a number: what it is and where it comes from; from one number to the next"],
  ["Ctrl Space", "what may be written here"],
];

/** What the keys do on the notebook page. */
export function KeysDialog({ onClose }: { onClose: () => void }) {
  return (
    <Dialog
      open
      onOpenChange={(open) => open || onClose()}
      title="Keys"
      description="On a Mac, ⌘ and ⌥ stand for Ctrl and Alt."
    >
      <dl className="keys">
        {keys.map(([key, effect]) => (
          <div key={key}>
            <dt>{key}</dt>
            <dd>{effect}</dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}
