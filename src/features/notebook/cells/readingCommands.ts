import { cellElement, type CellCommands } from "./useCellCommands";

const nothing = (): void => {};

/** Commands of a page that is only read: one can leave an editor, and change nothing. */
export const readingCommands: CellCommands = {
  write: nothing,
  replace: nothing,
  insert: nothing,
  insertFromHandbook: nothing,
  remove: nothing,
  rename: nothing,
  move: nothing,
  moveTo: nothing,
  openInsert: nothing,
  focusCell: (id) => cellElement(id)?.focus({ preventScroll: true }),
};
