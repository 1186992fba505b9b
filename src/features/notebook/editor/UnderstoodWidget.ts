import { WidgetType } from "@codemirror/view";
import { understoodParts } from "./understoodParts";

const elements = { raised: "sup", low: "sub", symbol: "i" } as const;

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
    for (const { text, setting } of understoodParts(this.text)) {
      const part =
        setting === "plain" ? document.createTextNode("") : document.createElement(elements[setting]);
      part.textContent = text;
      output.append(part);
    }
    return output;
  }

  override ignoreEvent(): boolean {
    return false;
  }
}
