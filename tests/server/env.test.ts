import { describe, expect, it } from "vitest";
import { readEnv } from "../../server/env";

describe("the settings", () => {
  it("have defaults", () => {
    expect(readEnv({})).toEqual({
      host: undefined,
      port: 4710,
      dataFolder: "data",
      databaseUrl: undefined,
      demo: false,
      origin: undefined,
      proxies: 0,
      logLevel: "info",
    });
  });

  it("count an empty variable as left out", () => {
    expect(readEnv({ PORT: "", TENUITY_DEMO: "" })).toMatchObject({ port: 4710, demo: false });
  });

  it("keep only the origin of a public address", () => {
    expect(readEnv({ TENUITY_ORIGIN: "https://tenuity.example/some/page" }).origin).toBe(
      "https://tenuity.example",
    );
  });

  it("name every variable that is wrong", () => {
    const variables = { PORT: "many", TENUITY_DEMO: "yes", TENUITY_ORIGIN: "tenuity", TENUITY_PROXIES: "-1" };
    expect(() => readEnv(variables)).toThrow(
      /PORT[\s\S]*TENUITY_DEMO[\s\S]*TENUITY_ORIGIN[\s\S]*TENUITY_PROXIES/,
    );
  });

  it("refuse the demonstration in production", () => {
    expect(() => readEnv({ TENUITY_DEMO: "on", NODE_ENV: "production" })).toThrow(/without a password/);
    expect(readEnv({ TENUITY_DEMO: "on", NODE_ENV: "development" }).demo).toBe(true);
  });
});
