import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { launchBrowser, openPage, signInAs, startServer, type RunningServer } from "./harness";

let server: RunningServer;
let browser: Browser;
beforeAll(async () => {
  server = await startServer();
  browser = await launchBrowser();
});
afterAll(async () => {
  await browser?.close();
  await server?.remove();
});

async function as(name: string): Promise<Page> {
  const { page } = await openPage(browser);
  await signInAs(page, server.origin, name);
  return page;
}

const file = (title: string, cell: string) =>
  `# ${title}\n\n\`\`\`notebook\nformat = 1\n\`\`\`\n\n\`\`\`values given\n${cell}\n\`\`\`\n`;

/** A notebook of the group, made from a file through the API of the page's own session. */
async function importNotebook(page: Page, text: string): Promise<string> {
  const groups = await (await page.request.get(`${server.origin}/api/groups`)).json();
  const headers = { Origin: server.origin };
  const data = { text, groupId: groups[0].id };
  const answer = await page.request.post(`${server.origin}/api/notebooks/import`, { headers, data });
  expect(answer.status()).toBe(201);
  return (await answer.json()).id;
}

describe("from a request to a reference in use", () => {
  it("a version is asked for, approved, read by strangers, and pinned in another notebook", async () => {
    const tamsin = await as("Tamsin Orevale");
    const id = await importNotebook(tamsin, file("Warmth of Oda", "T_oda = 321 K # occultation"));
    const headers = { Origin: server.origin };
    const kept = { message: "Kept", revision: 1 };
    await tamsin.request.post(`${server.origin}/api/notebooks/${id}/versions`, { headers, data: kept });
    await tamsin.goto(`${server.origin}/notebooks/${id}/versions`);
    await tamsin.getByRole("button", { name: "Ask for version 1 to be vetted" }).click();
    await tamsin.getByLabel("Message to the lead").fill("Please look.");
    await tamsin.getByLabel("Summary, as it is published").fill("How warm Oda is.");
    await tamsin.getByRole("button", { name: "Ask for vetting", exact: true }).click();
    await tamsin.getByText(/is in vetting/).waitFor();

    const jorun = await as("Jorun Aldaker");
    await jorun.getByRole("link", { name: "Vetting" }).click();
    await jorun.getByRole("link", { name: "Warmth of Oda" }).click();
    await jorun.getByRole("heading", { name: "Checks" }).waitFor();
    await jorun.getByLabel("It may be read without an account").check();
    await jorun.getByRole("button", { name: "Approve and publish" }).click();
    await jorun.waitForURL(/\/references\/CAR3\.1$/);

    const { page: stranger } = await openPage(browser);
    await stranger.goto(`${server.origin}/references/CAR3.1`);
    await stranger.getByRole("heading", { name: "Warmth of Oda", level: 1 }).waitFor();
    expect(await stranger.getByText("ref(CAR3.1, T_oda)").count()).toBeGreaterThan(0);

    const other = await importNotebook(tamsin, file("Uses Oda", "T_twice = 2 * ref(CAR3.1, T_oda)"));
    await tamsin.goto(`${server.origin}/notebooks/${other}`);
    await tamsin.getByText("642 K").first().waitFor();
  });
});
