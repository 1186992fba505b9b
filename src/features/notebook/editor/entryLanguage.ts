import { HighlightStyle, LanguageSupport, LRLanguage, syntaxHighlighting } from "@codemirror/language";
import { tags } from "@lezer/highlight";
import { cellParser } from "../../../../shared/notebook/language/parser";

const language = LRLanguage.define({
  name: "cell",
  parser: cellParser,
  languageData: { commentTokens: { line: "#" }, closeBrackets: { brackets: ["("] } },
});

/** Weight and colour by what a part is; colours stand in notebook.css. */
const style = HighlightStyle.define([
  { tag: tags.definition(tags.propertyName), class: "entry-key" },
  { tag: tags.function(tags.variableName), class: "entry-function" },
  { tag: tags.unit, class: "entry-unit" },
  { tag: tags.lineComment, class: "entry-remark" },
  { tag: tags.invalid, class: "entry-invalid" },
]);

/** The cell language in an editor: the grammar that evaluates is the one that colours. */
export const entryLanguage = new LanguageSupport(language, [syntaxHighlighting(style)]);
