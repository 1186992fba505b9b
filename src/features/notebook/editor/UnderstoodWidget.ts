import { WidgetType } from "@codemirror/view";

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
    output.append(...raisedPowers(this.text));
    return output;
  }

  override ignoreEvent(): boolean {
    return false;
  }
}

/** "m^-2" as m with a raised −2. */
function raisedPowers(text: string): (string | HTMLElement)[] {
  return text.split(/\^(\(?[-−+]?[\d.]+\)?)/).map((part, index) => {
    if (index % 2 === 0) return part;
    const raised = document.createElement("sup");
    raised.textContent = part.replace(/[()]/g, "").replace("-", "−");
    return raised;
  });
}
