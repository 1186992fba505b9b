import { WidgetType } from "@codemirror/view";
import { formatUnderstood } from "./formatUnderstood";
import { richNodes } from "./richNodes";

/** The value as understood, quiet, after the expression it belongs to. */
export class UnderstoodWidget extends WidgetType {
  constructor(readonly text: string) {
    super();
  }

  override eq(other: UnderstoodWidget): boolean {
    return other.text === this.text;
  }

  override toDOM(): HTMLElement {
    const output = document.createElement("span");
    output.className = "entry-understood";
    output.append(...richNodes(formatUnderstood(this.text)));
    return output;
  }

  override ignoreEvent(): boolean {
    return false;
  }
}
