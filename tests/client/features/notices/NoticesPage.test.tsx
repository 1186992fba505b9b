import { fireEvent, screen, waitFor } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { Notice, NoticesResponse } from "../../../../shared/schemas/notices";
import { NoticesPage } from "../../../../src/features/notices/NoticesPage";
import { NoticesWord } from "../../../../src/features/notices/NoticesWord";
import { answerWith, problemAnswer, type Answers } from "../../answers";
import { renderPage } from "../../renderPage";

afterEach(() => vi.unstubAllGlobals());

const notice = (change: Partial<Notice> = {}): Notice => ({
  id: "1",
  kind: "mention",
  by: { id: "w", name: "Wiremu Castellane" },
  at: "2026-11-30T09:15:00.000Z",
  isRead: false,
  notebook: { id: "n", title: "Escape from Ilmara" },
  thread: { id: "t", version: null, cellName: "dayside" },
  excerpt: "Is it measured?",
  ...change,
});

const two: NoticesResponse = {
  notices: [
    notice(),
    notice({ id: "2", kind: "reply", isRead: true, thread: { id: "u", version: 3, cellName: "leak" } }),
  ],
  unread: 1,
};

function show(answers: Answers) {
  const asked = answerWith(answers);
  renderPage(
    <>
      <NoticesWord />
      <NoticesPage />
    </>,
  );
  return asked;
}

describe("the notices", () => {
  it("say who did what where, lead to the thread, and count what is new in the bar", async () => {
    show({ "GET /notices": { body: two } });
    const mention = await screen.findByRole("link", { name: "Wiremu Castellane mentions you on dayside" });
    expect(mention.getAttribute("href")).toBe("/notebooks/n#thread-t");
    const reply = screen.getByRole("link", { name: "Wiremu Castellane replies on leak, version 3" });
    expect(reply.getAttribute("href")).toBe("/notebooks/n/versions/3#thread-u");
    expect(screen.getByRole("link", { name: "Notices, one new" })).toBeDefined();
    expect(
      screen.getAllByRole("img", { name: /read/ }).map((mark) => mark.getAttribute("aria-label")),
    ).toEqual(["to be read", "read"]);
  });

  it("are marked as read one by one or all together", async () => {
    const read = { notices: two.notices.map((one) => ({ ...one, isRead: true })), unread: 0 };
    const asked = show({ "GET /notices": { body: two }, "POST /notices/read": { body: read } });
    fireEvent.click(await screen.findByRole("button", { name: /^Mark as read: Wiremu/ }));
    await waitFor(() => expect(screen.queryByRole("button", { name: "Mark all as read" })).toBeNull());
    expect(asked.find(({ method }) => method === "POST")?.body).toEqual({ ids: ["1"] });
    expect(screen.getByRole("link", { name: "Notices" })).toBeDefined();
  });

  it("that could not be marked say so and stay", async () => {
    const failed = problemAnswer(500, "internal", "The server failed. Try again.");
    show({ "GET /notices": { body: two }, "POST /notices/read": failed });
    fireEvent.click(await screen.findByRole("button", { name: "Mark all as read" }));
    expect((await screen.findByRole("alert")).textContent).toContain(
      "Nothing was marked. The server failed.",
    );
  });

  it("where there are none, say what would stand there", async () => {
    show({ "GET /notices": { body: { notices: [], unread: 0 } } });
    expect(await screen.findByText(/When someone mentions you/)).toBeDefined();
  });
});
