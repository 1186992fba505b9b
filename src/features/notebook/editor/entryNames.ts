import { syntaxTree } from "@codemirror/language";
import { Facet, RangeSetBuilder, type EditorState, type Extension } from "@codemirror/state";
import type { EditorView } from "@codemirror/view";
import { Decoration, ViewPlugin, type DecorationSet, type ViewUpdate } from "@codemirror/view";
import { gasStyle } from "../../../lib/gasStyle";

/** What the names in a cell may stand for. */
export interface NameSurroundings {
  /** Formulas known as gases here: the handbook's and those of gas cells. */
  isGas: (name: string) => boolean;
  /** Names of cells and values. */
  names: ReadonlySet<string>;
  /** Gases that stand together in this cell's figures, so that colours agree with them. */
  gases: readonly string[];
}

const nowhere: NameSurroundings = { isGas: () => false, names: new Set(), gases: [] };

export const nameSurroundings = Facet.define<NameSurroundings, NameSurroundings>({
  combine: (given) => given[0] ?? nowhere,
});

/** Gases in their colour, and a dotted line under names that come from elsewhere in the notebook. */
export const entryNames: Extension = ViewPlugin.fromClass(
  class {
    decorations: DecorationSet;

    constructor(view: EditorView) {
      this.decorations = markNames(view.state, view.visibleRanges);
    }

    update(update: ViewUpdate): void {
      const isMoved = update.docChanged || update.viewportChanged;
      const isReread = syntaxTree(update.startState) !== syntaxTree(update.state);
      const isElsewhere = update.startState.facet(nameSurroundings) !== update.state.facet(nameSurroundings);
      if (isMoved || isReread || isElsewhere) {
        this.decorations = markNames(update.state, update.view.visibleRanges);
      }
    }
  },
  { decorations: (plugin) => plugin.decorations },
);

const reference = Decoration.mark({ class: "entry-reference" });

function markNames(state: EditorState, ranges: readonly { from: number; to: number }[]): DecorationSet {
  const { isGas, names, gases } = state.facet(nameSurroundings);
  const builder = new RangeSetBuilder<Decoration>();
  for (const { from, to } of ranges) {
    syntaxTree(state).iterate({
      from,
      to,
      enter(node) {
        if (node.name !== "Name") return;
        const name = plainDigits(state.sliceDoc(node.from, node.to));
        if (isGas(name)) {
          const { colour } = gasStyle(name, gases);
          builder.add(
            node.from,
            node.to,
            Decoration.mark({ class: "entry-gas", attributes: { style: `color:${colour}` } }),
          );
        } else if (names.has(name) || names.has(name.split(".", 1)[0]!)) {
          builder.add(node.from, node.to, reference);
        }
      },
    });
  }
  return builder.finish();
}

/** Subscript digits, as pasted from a paper, read as digits. */
function plainDigits(name: string): string {
  return name.replace(/[\u2080-\u2089]/g, (digit) => String(digit.charCodeAt(0) - 0x2080));
}
