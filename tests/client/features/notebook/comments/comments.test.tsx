import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { afterEach, beforeAll, describe, expect, it, vi } from "vitest";
import type { Thread } from "../../../../../shared/schemas/comments";
import type { NotebookResponse } from "../../../../../shared/schemas/notebooks";
import { servedNotebookActions } from "../../../../../shared/schemas/roles";
import { CellThreadMarks, CommentWord } from "../../../../../src/features/notebook/comments/CellThreadMarks";
import { CellThreads, GoneThreads } from "../../../../../src/features/notebook/comments/CellThreads";
import { CommentsDesk } from "../../../../../src/features/notebook/comments/CommentsDesk";
import { answerWith, problemAnswer, type Answers } from "../../../answers";
import { renderPage } from "../../../renderPage";
import { aNotebook } from "../aNotebook";
import { aComment, aThread, tamsin, wiremu } from "./aThread";

beforeAll(() => {
  // jsdom lays nothing out, so there is nowhere to scroll to.
  Element.prototype.scrollIntoView = () => {};
});
afterEach(() => vi.unstubAllGlobals());

const { cells } = aNotebook();
const air = cells.find(({ id }) => id === "air")!;

const notebook = (canComment: boolean): NotebookResponse => ({
  id: "n",
  title: "Escape from Ilmara",
  owner: tamsin,
  group: null,
  role: canComment ? "commenter" : "reader",
  sharedWith: 1,
  revision: 1,
  savedAt: "2026-11-12T14:31:00.000Z",
  savedBy: tamsin,
  document: aNotebook(),
  lastVersion: null,
  isArchived: false,
  abilities: Object.fromEntries(
    servedNotebookActions.map((action) => [action, action === "comment" && canComment]),
  ) as NotebookResponse["abilities"],
});

function show(threads: Thread[], { canComment = true, answers = {} as Answers } = {}) {
  const asked = answerWith({
    "GET /notebooks/n/threads": { body: threads },
    "GET /notebooks/n/readers": { body: [tamsin, wiremu] },
    ...answers,
  });
  renderPage(
    <CommentsDesk notebook={notebook(canComment)} version={null} cells={cells}>
      <CellThreadMarks cell={air} />
      <CommentWord cell={air} />
      <CellThreads cell={air} />
      <GoneThreads />
    </CommentsDesk>,
    { user: { ...tamsin, email: "t@carrow.example" } },
  );
  return asked;
}

const threadOn = () => screen.findByRole("article", { name: "Thread † on Column dayside" });

describe("a thread", () => {
  it("stands under its cell with who said what; Markdown and names are set, HTML is not", async () => {
    const text =
      "**Bold** <img src=x onerror=alert(1)> [link](javascript:alert(1)) @Tamsin Orevale `@Tamsin Orevale`";
    show([aThread({ comments: [aComment({ text, mentions: [tamsin] })] })]);
    const thread = await threadOn();
    expect(await within(thread).findByText("Bold")).toHaveProperty("tagName", "STRONG");
    expect(within(thread).getByText("Wiremu Castellane")).toBeDefined();
    expect(thread.querySelector("img, script, [onerror]")).toBeNull();
    expect(thread.querySelector("a")?.getAttribute("href") ?? "").not.toContain("javascript");
    expect([...thread.querySelectorAll(".mention")].map((mention) => mention.textContent)).toEqual([
      "@Tamsin Orevale",
    ]);
  });

  it("has its key on the cell, which says what is new and leads there", async () => {
    show([aThread({ isUnread: true })]);
    const mark = await screen.findByRole("button", {
      name: "Thread † on Column dayside, one comment, one new",
    });
    fireEvent.click(mark);
    const thread = await threadOn();
    await waitFor(() => expect(document.activeElement).toBe(thread));
  });

  it("is answered, and the answer stands at once", async () => {
    const replied = aThread({
      comments: [aComment(), aComment({ id: "second", author: tamsin, text: "No." })],
    });
    let hasReplied = false;
    const asked = show([], {
      answers: {
        "GET /notebooks/n/threads": () => ({ body: [hasReplied ? replied : aThread()] }),
        [`POST /notebooks/n/threads/${aThread().id}/comments`]: () => {
          hasReplied = true;
          return { status: 201, body: replied };
        },
      },
    });
    fireEvent.click(await screen.findByRole("button", { name: "Reply in thread †" }));
    const field = screen.getByRole("textbox", { name: "Reply in thread †" });
    fireEvent.change(field, { target: { value: "  No. " } });
    fireEvent.keyDown(field, { key: "Enter", ctrlKey: true });
    expect(await screen.findByText("No.")).toBeDefined();
    expect(asked.find(({ method }) => method === "POST")?.body).toEqual({ text: "No." });
    await waitFor(() => expect(screen.queryByRole("textbox")).toBeNull());
  });

  it("that is resolved is folded to a line, with who did it, and can be shown", async () => {
    show([aThread({ resolved: { by: tamsin, at: "2026-12-01T08:00:00.000Z" } })]);
    const thread = await threadOn();
    expect(thread.textContent).toContain("Resolved by Tamsin Orevale, one comment");
    expect(within(thread).queryByText("Wiremu Castellane")).toBeNull();
    fireEvent.click(within(thread).getByRole("button", { name: "Show thread †" }));
    expect(within(thread).getByText("Wiremu Castellane")).toBeDefined();
    expect(within(thread).getByRole("button", { name: "Reopen thread †" })).toBeDefined();
  });

  it("whose cell is gone says so and keeps what the cell said", async () => {
    show([aThread({ cellId: "removed" })]);
    const thread = await threadOn();
    expect(thread.textContent).toContain("Column dayside is gone.");
    expect(thread.querySelector("pre")!.textContent).toBe("base = 80 km");
  });

  it("is only read by readers", async () => {
    show([aThread({ abilities: { reply: false, resolve: false } })], { canComment: false });
    const thread = await threadOn();
    expect(within(thread).queryByRole("button", { name: /Reply|Resolve/ })).toBeNull();
    expect(screen.queryByRole("button", { name: "Comment on Column dayside" })).toBeNull();
  });
});

describe("a new comment", () => {
  it("is begun from its cell, with names completed by key", async () => {
    const asked = show([], {
      answers: { "POST /notebooks/n/threads": { status: 201, body: aThread() } },
    });
    fireEvent.click(await screen.findByRole("button", { name: "Comment on Column dayside" }));
    const field = screen.getByRole<HTMLTextAreaElement>("textbox", { name: "Comment on Column dayside" });
    await waitFor(() => {
      fireEvent.change(field, { target: { value: "" } });
      fireEvent.change(field, { target: { value: "Ask @" } });
      expect(screen.getAllByRole("option")).toHaveLength(2);
    });
    fireEvent.keyDown(field, { key: "ArrowDown" });
    expect(screen.getByRole("option", { selected: true }).textContent).toBe(wiremu.name);
    fireEvent.keyDown(field, { key: "Enter" });
    expect(field.value).toBe(`Ask @${wiremu.name} `);
    expect(screen.queryByRole("listbox")).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: "Comment" }));
    await waitFor(() => expect(screen.queryByRole("textbox")).toBeNull());
    expect(asked.find(({ method }) => method === "POST")?.body).toEqual({
      cellId: "air",
      version: null,
      text: `Ask @${wiremu.name}`,
    });
  });

  it("that is refused stays in its field, with the reason", async () => {
    const reason = "Jorun Aldaker may not see this notebook and would not read this.";
    show([], {
      answers: { "POST /notebooks/n/threads": problemAnswer(422, "mention_unseen", reason) },
    });
    fireEvent.click(await screen.findByRole("button", { name: "Comment on Column dayside" }));
    const field = screen.getByRole<HTMLTextAreaElement>("textbox");
    fireEvent.change(field, { target: { value: "Ask @Jorun Aldaker" } });
    fireEvent.click(screen.getByRole("button", { name: "Comment" }));
    expect((await screen.findByRole("alert")).textContent).toBe(reason);
    expect(field.value).toBe("Ask @Jorun Aldaker");
  });

  it("that is too long says by how much, and is not sent", async () => {
    const asked = show([]);
    fireEvent.click(await screen.findByRole("button", { name: "Comment on Column dayside" }));
    fireEvent.change(screen.getByRole("textbox"), { target: { value: "x".repeat(10_003) } });
    expect(screen.getByText(/Too long by 3 characters/)).toBeDefined();
    fireEvent.keyDown(screen.getByRole("textbox"), { key: "Enter", ctrlKey: true });
    expect(asked.some(({ method }) => method === "POST")).toBe(false);
  });

  it("of one's own is deleted only when asked twice", async () => {
    const own = aThread({ comments: [aComment({ author: tamsin, abilities: { edit: true } })] });
    const asked = show([own], {
      answers: { [`DELETE /notebooks/n/threads/${own.id}/comments/first`]: { status: 204 } },
    });
    fireEvent.click(await screen.findByRole("button", { name: "delete" }));
    expect(asked.some(({ method }) => method === "DELETE")).toBe(false);
    fireEvent.click(screen.getByRole("button", { name: "Delete" }));
    await waitFor(() => expect(asked.some(({ method }) => method === "DELETE")).toBe(true));
  });
});
