import { styleTags, tags } from "@lezer/highlight";

/** What each part of a cell is to a highlighter. */
export const cellHighlighting = styleTags({
  "Key/...": tags.definition(tags.propertyName),
  "ArgumentName/...": tags.attributeName,
  "FunctionName/...": tags.function(tags.variableName),
  "Name/...": tags.variableName,
  "UnitName/...": tags.unit,
  Number: tags.number,
  "Between And Within Factor From To In Steps": tags.keyword,
  "Plus Minus Times Over Per Join Caret Superscript": tags.arithmeticOperator,
  "Open Close": tags.paren,
  Comma: tags.separator,
  Remark: tags.lineComment,
  "DecimalComma DoubleStar String": tags.invalid,
});
