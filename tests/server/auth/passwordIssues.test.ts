import { describe, expect, it } from "vitest";
import { passwordIssues } from "../../../server/auth/passwordIssues";

const wiremu = { name: "Wiremu Castellane", email: "w.castellane@carrow.example" };
const isRefused = (password: string) => passwordIssues({ ...wiremu, password }).length > 0;

describe("a password that everyone knows", () => {
  it.each([
    "w.castellane@carrow.example",
    "W.Castellane@Carrow.Example",
    "wiremucastellane",
    "Wiremu Castellane",
    "castellane2026",
    "wiremuwiremu",
    "w-castellane-99",
    "TenuityTenuity",
    "tenuity123456",
    "aaaaaaaaaaaaaa",
    "------------",
  ])("%s is refused", (password) => {
    expect(isRefused(password)).toBe(true);
  });

  it.each(["copper kettle at dusk", "castellane keeps bees", "908172635445", "ütenwëlkchens-3"])(
    "%s is taken",
    (password) => {
      expect(isRefused(password)).toBe(false);
    },
  );
});
