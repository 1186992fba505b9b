import { expect, it } from "vitest";
import { formatMessage } from "../../../src/lib/formatMessage";
import { plainText } from "../../../src/lib/richText";

it("sets words of the cell language in their own type and lowers digits of gases alone", () => {
  const rich = formatMessage("No entry *level* for CO2; see CAR 4, edition 2.");
  expect(rich).toContainEqual({ code: "level" });
  expect(rich).toContainEqual({ sub: "2" });
  expect(rich.filter((piece) => typeof piece !== "string" && "sub" in piece)).toHaveLength(1);
  expect(plainText(rich)).toBe("No entry level for CO2; see CAR 4, edition 2.");
});
