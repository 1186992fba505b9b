import express from "express";
import { pino } from "pino";
import request from "supertest";
import { describe, expect, it } from "vitest";
import { z } from "zod";
import { errorHandler } from "../../../server/middleware/errorHandler";
import { requestLog } from "../../../server/middleware/requestLog";
import { PhysicsDomainError } from "../../../shared/physics/errors";
import { problem } from "../../../shared/schemas/problem";

/** A server whose only answer is this failure, with what it logged. */
function failing(error: unknown) {
  const lines: string[] = [];
  const logger = pino({ level: "info" }, { write: (line: string) => lines.push(line) });
  const app = express();
  app.use(requestLog(logger), express.json({ limit: "1kb" }));
  app.use(() => {
    throw error;
  });
  app.use(errorHandler);
  return { agent: request(app), lines };
}

describe("the answer to a failure", () => {
  it("lists every issue of a validation", async () => {
    const { error } = z
      .object({ a: z.number(), b: z.object({ c: z.array(z.string()) }) })
      .safeParse({ b: { c: [1, 2] } });
    const response = await failing(error).agent.get("/");
    expect(response.status).toBe(422);
    expect(response.type).toBe("application/problem+json");
    expect(problem.parse(response.body).issues!.map(({ path }) => path)).toEqual(["a", "b.c.0", "b.c.1"]);
  });

  it("hands on what physics says of an impossible input", async () => {
    const response = await failing(new PhysicsDomainError("temperature", -3, "above zero")).agent.get("/");
    expect(response.status).toBe(422);
    expect(response.body).toMatchObject({ issues: [{ path: "temperature", code: "out_of_domain" }] });
    expect(response.body.detail).toMatch(/temperature is -3/);
  });

  it("is 400 for malformed JSON, 413 for too much, 415 for an unknown encoding", async () => {
    const { agent } = failing(new Error("not reached"));
    const malformed = await agent.post("/").set("Content-Type", "application/json").send('{"a":');
    expect(malformed.status).toBe(400);
    expect(problem.parse(malformed.body).code).toBe("malformed_json");
    expect((await agent.post("/").send({ a: "x".repeat(2000) })).status).toBe(413);
    const encoded = await agent
      .post("/")
      .set("Content-Type", "application/json")
      .set("Content-Encoding", "zip")
      .send("{}");
    expect(encoded.status).toBe(415);
  });

  it("is bland for what nobody foresaw, and the log has the rest under the request's id", async () => {
    const { agent, lines } = failing(new Error("secret detail of the database"));
    const response = await agent.get("/api/x?token=1").set("Cookie", "tenuity_session=abcdef");
    expect(response.status).toBe(500);
    expect(response.text).not.toContain("secret");
    const { requestId, detail } = problem.parse(response.body);
    expect(detail).toContain(requestId);
    const line = lines.find((written) => written.includes("secret detail"));
    expect(line).toContain(requestId);
    expect(lines.join("")).not.toContain("abcdef");
  });
});
