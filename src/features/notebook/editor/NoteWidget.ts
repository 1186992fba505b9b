import { WidgetType, type EditorView } from "@codemirror/view";
import type { Note } from "../../../../shared/notebook/result";
import { formatMessage } from "../../../lib/formatMessage";
import { complaintAndRest } from "../cells/complaintAndRest";
import { richNodes } from "./richNodes";

/** What is wrong with an entry, under it: the complaint, the reason, and the remedy as a word to press. */
export class NoteWidget extends WidgetType {
  constructor(
    readonly note: Note,
    /** What the note was said of: its remedy fits no other text. */
    readonly text: string,
  ) {
    super();
  }

  override eq({ note, text }: NoteWidget): boolean {
    const isSameText = text === this.text || (!note.remedy && !this.note.remedy);
    return isSameText && note.level === this.note.level && note.message === this.note.message;
  }

  override toDOM(view: EditorView): HTMLElement {
    const { level, message, remedy } = this.note;
    const [complaint, rest] = complaintAndRest(message);
    const line = element("div", `entry-note entry-note-${level}`);
    const first = element("strong", "");
    first.append(...richNodes(formatMessage(complaint)));
    line.append(first, ...richNodes(formatMessage(rest)));
    if (remedy && !view.state.readOnly) {
      const button = element("button", "entry-remedy");
      button.textContent = remedy.label;
      button.setAttribute("type", "button");
      button.addEventListener("click", () => {
        if (view.state.doc.toString() !== this.text) return;
        const changes = { ...remedy.range, insert: remedy.replacement };
        view.dispatch({ changes, userEvent: "input.remedy", scrollIntoView: true });
        view.focus();
      });
      line.append(button);
    }
    return line;
  }

  override ignoreEvent(): boolean {
    return true;
  }
}

function element(name: string, className: string): HTMLElement {
  const node = document.createElement(name);
  if (className !== "") node.className = className;
  return node;
}
