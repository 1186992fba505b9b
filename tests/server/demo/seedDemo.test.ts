import { readdirSync } from "node:fs";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { demoAccounts } from "../../../server/auth/demoAccounts";
import { demoNotebooks } from "../../../server/demo/demoNotebooks";
import { seedDemo } from "../../../server/demo/seedDemo";
import { evaluateDocument } from "../../../server/jobs/evaluateDocument";
import type { Evaluator } from "../../../server/jobs/evaluator";
import { letters } from "../../../server/db/tables/letters";
import { places } from "../../../server/places";
import { notebookListResponse, type NotebookListItem } from "../../../shared/schemas/notebooks";
import { groupInvitationList } from "../../../shared/schemas/invitations";
import { libraryResponse } from "../../../shared/schemas/references";
import { versionListResponse } from "../../../shared/schemas/versions";
import { vettingListResponse } from "../../../shared/schemas/vettings";
import { buildUser } from "../../factories/buildUser";
import { openTestDatabase } from "../testDatabase";
import { startTestServer, type TestServer } from "../testServer";

const evaluator: Evaluator = {
  evaluate: async (document) => ({ ok: true, outcome: evaluateDocument(document) }),
  close: async () => undefined,
};
const now = new Date("2026-12-01T10:42:00Z");

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer({ demo: true });
  expect(await seedDemo(server.db, { evaluator, now, linkOrigin: "https://tenuity.example" })).toBe(true);
  await server.summaries.catchUp();
  await server.summaries.idle();
});
afterAll(() => server.close());

const demoAgent = async (email: string) => {
  const response = await server.signedOut.post("/api/session/demo").send({ email });
  expect(response.status).toBe(201);
  return server.as(response.body.user);
};

const listFor = async (email: string): Promise<NotebookListItem[]> =>
  notebookListResponse.parse((await (await demoAgent(email)).get("/api/notebooks")).body).notebooks;

const rolesFor = async (email: string) =>
  Object.fromEntries((await listFor(email)).map(({ title, role }) => [title.split(/[^\p{L}]/u)[0], role]));

describe("the demonstration", () => {
  it("uses each of its notebooks", () => {
    const files = readdirSync(places.demoNotebooks).sort();
    expect(demoNotebooks.map(({ file }) => file).sort()).toEqual(files);
  });

  it("lets everyone in by one click, each to what they may see", async () => {
    expect(await rolesFor("t.orevale@carrow.example")).toEqual({
      Escape: "owner",
      How: "co-author",
      Nirel: "co-author",
      Saranth: "reader",
      Tessal: "reader",
      Oda: "owner",
    });
    expect(await rolesFor("w.castellane@carrow.example")).toMatchObject({
      Escape: "co-author",
      Nirel: "commenter",
    });
    expect(await rolesFor("p.marrash@carrow.example")).toMatchObject({ Escape: "reader", Nirel: "reader" });
    expect(await rolesFor("i.brandvold@carrow.example")).toMatchObject({ Nirel: "owner", Saranth: "owner" });
    const lead = await rolesFor("j.aldaker@carrow.example");
    expect(lead).toMatchObject({ Escape: "reader", Tessal: "reader" });
    expect(lead).not.toHaveProperty("Oda");
  });

  it("has a group with a lead, researchers and a guest", async () => {
    const agent = await demoAgent("p.marrash@carrow.example");
    const [group] = (await agent.get("/api/groups")).body;
    expect(group).toMatchObject({ name: "Carrow Aeronomy", code: "CAR", role: "guest", members: 5 });
  });

  it("has an invitation without an answer, whose letter waits", async () => {
    const agent = await demoAgent("j.aldaker@carrow.example");
    const [group] = (await agent.get("/api/groups")).body;
    const open = groupInvitationList.parse((await agent.get(`/api/groups/${group.id}/invitations`)).body);
    expect(open).toMatchObject([{ email: "l.verrano@lomme.example", role: "guest", hasLapsed: false }]);
    const [letter] = await server.db.select().from(letters);
    expect(letter).toMatchObject({ toAddress: "l.verrano@lomme.example", kind: "group_invitation" });
  });

  it("has kept versions, oldest differing from newest, and times that are past", async () => {
    const agent = await demoAgent("w.castellane@carrow.example");
    const [ilmara] = (await listFor("w.castellane@carrow.example")).filter(
      ({ lastVersion }) => lastVersion === 3,
    );
    expect(ilmara!.title).toMatch(/Ilmara/);
    const versions = versionListResponse.parse(
      (await agent.get(`/api/notebooks/${ilmara!.id}/versions`)).body,
    );
    expect(versions.map(({ keptBy }) => keptBy.name)).toEqual([
      "Tamsin Orevale",
      "Wiremu Castellane",
      "Tamsin Orevale",
    ]);
    expect(new Set(versions.map(({ contentHash }) => contentHash)).size).toBe(3);
    const times = [...versions.map(({ keptAt }) => keptAt).reverse(), ilmara!.savedAt, now.toISOString()];
    expect(times).toEqual(times.toSorted());
  });

  it("has two published references, one of them for strangers, and a version in vetting", async () => {
    const lead = await demoAgent("j.aldaker@carrow.example");
    const library = libraryResponse.parse((await lead.get("/api/references?state=any")).body);
    expect(library.map(({ pin }) => pin).sort()).toEqual(["CAR1.1", "CAR2.1"]);
    const open = libraryResponse.parse((await server.signedOut.get("/api/references")).body);
    expect(open.map(({ title }) => title)).toEqual(["Tessal under a quiet star"]);
    const [waiting] = vettingListResponse.parse((await lead.get("/api/vettings")).body);
    const { checks } = (await lead.get(`/api/vettings/${waiting!.id}`)).body;
    const verdicts = checks.map(({ verdict }: { verdict: string }) => verdict);
    expect(verdicts).toEqual(["holds", "holds", "to_judge", "holds", "holds", "holds", "holds"]);
  });

  it("has a summary of each notebook", async () => {
    for (const { summary } of await listFor("t.orevale@carrow.example")) {
      expect(summary!.headline.length).toBeGreaterThan(0);
      expect(summary!.strip).not.toBeNull();
    }
  });

  it("is seeded once", async () => {
    expect(await seedDemo(server.db, { evaluator, now, linkOrigin: "https://tenuity.example" })).toBe(false);
    expect(await listFor("t.orevale@carrow.example")).toHaveLength(6);
  });

  it("keeps away where someone has one of its addresses", async () => {
    const { db, close } = await openTestDatabase();
    await buildUser(db, { email: demoAccounts[2]!.email });
    expect(await seedDemo(db, { evaluator, now, linkOrigin: "https://tenuity.example" })).toBe(false);
    await close();
  });
});
