import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { launchBrowser, openPage, signInAs, startServer, type RunningServer } from "./harness";
import { entryLine, openNotebook, waitUntilSaved, writeEntry } from "./notebookParts";

const ilmara = /Escape of hydrogen from Ilmara/;

/** How long others may have to wait for what somebody did, ms. */
const atOnce = 2_000;

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

async function open(name: string): Promise<{ page: Page; complaints: string[] }> {
  const { page, complaints } = await openPage(browser);
  await signInAs(page, server.origin, name);
  await openNotebook(page, ilmara);
  return { page, complaints };
}

it("Two people in one notebook see each other, each other's saves and comments, and one of them shut out sees nothing", async () => {
  const tamsin = await open("Tamsin Orevale");
  const wiremu = await open("Wiremu Castellane");
  await tamsin.page.getByText("Wiremu Castellane has this notebook open").waitFor();

  await writeEntry(wiremu.page, "T_quiet", "433 ± 45 K");
  await waitUntilSaved(wiremu.page, "T_quiet = 433 ± 45 K");
  await entryLine(tamsin.page, "T_quiet").filter({ hasText: "433" }).waitFor({ timeout: atOnce });
  await tamsin.page.getByText("Wiremu Castellane has this notebook open, at values given.").waitFor();

  // Begun from the cell, with the name completed by key.
  await wiremu.page.getByRole("button", { name: "Comment on Values given" }).click();
  await wiremu.page.getByRole("textbox", { name: "Comment on Values given" }).waitFor();
  await wiremu.page.waitForFunction(() => document.activeElement?.tagName === "TEXTAREA");
  await wiremu.page.keyboard.type("Warmer by 5 K, <b>see</b> $T$. Right, @Tam");
  await wiremu.page.getByRole("option", { name: "Tamsin Orevale" }).waitFor();
  await wiremu.page.keyboard.press("Enter");
  await wiremu.page.keyboard.press("Control+Enter");
  const said = tamsin.page.locator(".thread", { hasText: "Warmer by 5 K" });
  await wiremu.page.locator(".thread .comment-text", { hasText: "Warmer by 5 K" }).waitFor();
  await said.waitFor({ timeout: atOnce });
  expect(await said.locator("b:not(.comment-head b)").count()).toBe(0);
  expect(await said.locator(".mention").innerText()).toBe("@Tamsin Orevale");
  expect(await said.locator(".katex").count()).toBe(1);

  // Threads stand beside their cells and not over one another.
  const boxes = await tamsin.page.locator(".margin-thread").evaluateAll((threads) =>
    threads.map((thread) => {
      const { top, bottom } = thread.getBoundingClientRect();
      return { top, bottom };
    }),
  );
  expect(boxes.length).toBeGreaterThan(3);
  boxes.slice(1).forEach(({ top }, index) => expect(top).toBeGreaterThan(boxes[index]!.bottom));

  await said.getByRole("button", { name: /^Reply/ }).click();
  await tamsin.page.waitForFunction(() => document.activeElement?.tagName === "TEXTAREA");
  await tamsin.page.keyboard.type("Right.");
  await tamsin.page.keyboard.press("Control+Enter");
  await wiremu.page
    .locator(".thread", { hasText: "Warmer by 5 K" })
    .getByText("Right.", { exact: true })
    .waitFor({ timeout: atOnce + 1_000 });

  const notices = await wiremu.page.context().newPage();
  await notices.goto(`${server.origin}/notices`);
  await notices.getByRole("link", { name: "Tamsin Orevale replies on given" }).first().click();
  await notices.locator(".thread:focus", { hasText: "Warmer by 5 K" }).waitFor();
  await notices.close();

  const id = new URL(tamsin.page.url()).pathname.split("/")[2]!;
  const shares = await tamsin.page.request.get(`${server.origin}/api/notebooks/${id}/shares`);
  const { people } = (await shares.json()) as { people: { user: { id: string; name: string } }[] };
  const wiremuId = people.find(({ user }) => user.name === "Wiremu Castellane")!.user.id;
  const headers = { Origin: server.origin };
  await tamsin.page.request.put(`${server.origin}/api/notebooks/${id}/group-share`, {
    data: { role: null },
    headers,
  });
  await tamsin.page.request.delete(`${server.origin}/api/notebooks/${id}/shares/${wiremuId}`, { headers });
  await wiremu.page
    .getByText("There is no page at this address, or it isn’t open to you.")
    .waitFor({ timeout: atOnce });
  await tamsin.page.getByText("Wiremu Castellane has this notebook open").waitFor({ state: "detached" });
  expect([...tamsin.complaints, ...wiremu.complaints]).toEqual([]);
});
