import type { Note, TextRange } from "../result";
import { changeTo, fault } from "./notes";
import type { NumberNode } from "./syntax";

const superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/** "⁻³" as "-3". */
export function fromSuperscript(text: string): string {
  let plain = "";
  for (const character of text) {
    if (character === "⁻") plain += "-";
    else if (character !== "⁺") plain += String(superscripts.indexOf(character));
  }
  return plain;
}

/** A power of ten beyond this is out of range whatever the digits; kept so that none becomes infinite. */
const largestPower = 99_999;

/** `1`, `1 000` with thin spaces, `1.5e3`, `1.5×10^3`, `1.5×10⁻³`: digits and power of ten apart. */
export function readNumber(text: string, range: TextRange): NumberNode | Note {
  const [, written = "", exponent, times, raised] =
    /^([\d.\u00a0\u2009\u202f]+?)(?:[eE]([+\-−]?\d+)|[ \u00a0\u2009\u202f]*×[ \u00a0\u2009\u202f]*10(?:\^([+\-−]?\d+)|([⁺⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)))?$/.exec(
      text,
    ) ?? [];
  const [whole = "", fraction] = written.split(".");
  if (/[^\d]/.test(whole) && !/^\d{1,3}(?:[\u00a0\u2009\u202f]\d{3})+$/.test(whole)) {
    const joined = text.replace(/[\u00a0\u2009\u202f]/g, "");
    return fault(
      "digits_grouped",
      range,
      "Digits are grouped in threes, as in 1\u202f000\u202f000; these are not.",
      changeTo(range, joined),
    );
  }
  const digits = whole.replace(/[^\d]/g, "") || "0";
  const powerText = (exponent ?? times ?? (raised === undefined ? "0" : fromSuperscript(raised))).replace(
    "−",
    "-",
  );
  const power = Math.max(-largestPower, Math.min(largestPower, Number(powerText)));
  return {
    type: "number",
    digits: fraction ? `${digits}.${fraction}` : digits,
    powerOfTen: power,
    range,
  };
}

/** `2,7`: the decimal sign is the point, and a comma without a space could be a list. */
export function decimalCommaFault(text: string, range: TextRange): Note {
  const parts = text.split(",");
  const inThrees = parts.slice(1).every((part) => /^\d{3}(?![\d])/.test(part));
  if (parts.length > 2 && inThrees) {
    const joined = parts.join("");
    return fault(
      "decimal_comma",
      range,
      `Thousands are not parted by commas. Write ${joined}; in a list, put a space after each comma.`,
      changeTo(range, joined),
    );
  }
  if (parts.length > 2)
    return fault("decimal_comma", range, "In a list, put a space after each comma.", {
      label: "Put a space after each comma",
      range,
      replacement: parts.join(", "),
    });
  const point = parts.join(".");
  if (inThrees)
    return fault(
      "decimal_comma",
      range,
      `The decimal sign is the point, and thousands are not parted by commas. Write ${point} or ${parts.join("")}.`,
    );
  return fault(
    "decimal_comma",
    range,
    `The decimal sign is the point. Write ${point}; in a list, put a space after the comma.`,
    changeTo(range, point),
  );
}
