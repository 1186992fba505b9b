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
      smtp: null,
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

  it("take a mail server whole, or none", () => {
    const whole = { TENUITY_SMTP_HOST: "mail.tenuity.example", TENUITY_SMTP_FROM: "post@tenuity.example" };
    expect(readEnv(whole).smtp).toEqual({
      host: "mail.tenuity.example",
      port: 587,
      user: undefined,
      password: undefined,
      from: "post@tenuity.example",
    });
    expect(() => readEnv({ TENUITY_SMTP_HOST: "mail.tenuity.example" })).toThrow(/TENUITY_SMTP_FROM/);
    expect(() => readEnv({ ...whole, TENUITY_SMTP_USER: "post" })).toThrow(/TENUITY_SMTP_PASSWORD/);
  });
});
