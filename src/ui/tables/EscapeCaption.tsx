import type { CellResult } from "../../../shared/notebook/result";
import {
  formatFixed,
  formatQuantity,
  kilometreScale,
  quantityRich,
  unitSpace,
  type UnitSystem,
} from "../../lib/format";
import { formatMessage } from "../../lib/formatMessage";
import { formatUncertain, numberSpread } from "../../lib/formatSpread";
import { Rich } from "../../lib/Rich";
import type { RichText } from "../../lib/richText";
import type { EscapeTableProps } from "./tableProps";

const regimes: Record<string, string> = {
  jeans: "Jeans",
  jeans_estimate: "Jeans, as an estimate",
  transition: "between Jeans escape and a wind",
  wind: "a wind",
};

const couplings = {
  coupled: "Thermal escape, solved together with its flux.",
  open: "Thermal escape on an open column, which does not reckon with its flux.",
};

/** "bulk, l = H" with its symbols in italics. */
const criterionRich = (criterion: string): RichText =>
  criterion
    .split(/\b([lH])\b/)
    .map((piece, index) => (index % 2 === 1 ? { italic: piece } : piece))
    .filter((piece) => piece !== "");

/** 239 km, in tens of metres where it is low; with ± where a spread watches it. */
function altitudeRich({ values }: CellResult, unitSystem: UnitSystem): RichText {
  const { value, spread } = values["exobase.altitude"]!;
  const altitude = Number(value);
  const watched = numberSpread(spread);
  if (watched)
    return quantityRich(
      formatUncertain({ value: altitude, unit: "m" }, watched, unitSystem, { scale: kilometreScale }),
    );
  const kilometres = altitude / 1000;
  return [`${formatFixed(kilometres, Math.abs(kilometres) < 10 ? 2 : 0)}${unitSpace}km`];
}

/** What the numbers rest on, where the exobase is or why there is none, and which regime holds. */
export function EscapeCaption({
  result,
  convention,
  unitSystem,
}: Pick<EscapeTableProps, "result" | "convention" | "unitSystem">) {
  const number = (name: string) => {
    const value = result.values[name]?.value;
    return typeof value === "number" ? value : null;
  };
  const [altitude, temperature] = [number("exobase.altitude"), number("exobase.temperature")];
  const [speed, bulk] = [number("exobase.escape_speed"), number("bulk_escape_parameter")];
  const regime = result.values.regime?.value;
  const reason = result.notes.find(({ code }) => code.startsWith("no_exobase_"));
  return (
    <>
      {convention && altitude !== null ? couplings[convention.coupling] : "Thermal escape."}
      {altitude === null && reason && (
        <>
          {" "}
          <Rich text={formatMessage(reason.message)} />
        </>
      )}
      {altitude !== null && temperature !== null && speed !== null && (
        <>
          {" "}
          Exobase
          {convention && (
            <>
              {" "}
              (<Rich text={criterionRich(convention.criterion)} />)
            </>
          )}{" "}
          at <Rich text={altitudeRich(result, unitSystem)} />, where <i>T</i> = {formatFixed(temperature)}
          {unitSpace}K and <i>v</i>
          <sub>esc</sub> ={" "}
          <Rich text={quantityRich(formatQuantity({ value: speed, unit: "m s^-1" }, unitSystem))} />.
        </>
      )}
      {typeof regime === "string" && bulk !== null && (
        <>
          {" "}
          Regime: {regimes[regime] ?? regime}; λ of the mean mass there is{" "}
          {formatFixed(bulk, bulk < 10 ? 2 : 0)}.
        </>
      )}
    </>
  );
}
