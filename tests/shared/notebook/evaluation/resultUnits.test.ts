import { expect, it } from "vitest";
import { dimensionOfUnit } from "../../../../shared/notebook/evaluation/resultUnits";
import { quantityKinds } from "../../../../shared/notebook/language/dimensions";
import { siUnitText } from "../../../../shared/notebook/language/formatQuantity";

it.each(Object.entries(quantityKinds))("reads the unit that results carry for %s", (_, { dimension }) => {
  expect(dimensionOfUnit(siUnitText(dimension))).toEqual(dimension);
});

it("reads composed units with fractions of powers", () => {
  expect(dimensionOfUnit(siUnitText([0.5, 0, -1, 2, 0, 0]))).toEqual([0.5, 0, -1, 2, 0, 0]);
});
