import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { NotebookListItem } from "../../../../shared/schemas/notebooks";
import { NotebooksPage } from "../../../../src/features/notebooks/NotebooksPage";
import type { GroupSummary } from "../../../../shared/schemas/groups";
import { servedGroupActions, servedNotebookActions } from "../../../../shared/schemas/roles";
import { answerWith, problemAnswer } from "../../answers";
import { renderPage } from "../../renderPage";

const mayAll = {
  ...(Object.fromEntries(
    servedNotebookActions.map((action) => [action, true]),
  ) as NotebookListItem["abilities"]),
  restoreFromBin: false,
  requestVetting: false,
  answerCautions: false,
  unarchive: false,
};

function notebook(id: string, title: string, more: Partial<NotebookListItem> = {}): NotebookListItem {
  return {
    id,
    title,
    owner: { id: "t", name: "Tamsin Orevale" },
    coAuthors: [],
    group: null,
    role: "owner",
    revision: 1,
    savedAt: "2026-03-01T10:00:00.000Z",
    lastVersion: null,
    summary: {
      engine: "1.0.0",
      headline: [
        {
          name: "leak.exobase.altitude",
          label: "Exobase",
          value: 239_400,
          log10: null,
          unit: "m",
          gas: null,
          note: "",
        },
        {
          name: "leak.H.rate",
          label: "Hydrogen leaves",
          value: null,
          log10: -310.4,
          unit: "s^-1",
          gas: "H",
          note: "",
        },
      ],
      faults: 0,
      cautions: 1,
      remarks: 0,
      bodies: ["ilmara"],
      strip: null,
    },
    deletedAt: null,
    isArchived: false,
    abilities: mayAll,
    ...more,
  };
}

const carrow: GroupSummary = {
  id: "car",
  name: "Carrow Aeronomy",
  code: "CAR",
  role: "researcher",
  members: 5,
  abilities: Object.fromEntries(
    servedGroupActions.map((action) => [action, true]),
  ) as GroupSummary["abilities"],
};

const ilmara = notebook("a", "Escape of hydrogen from Ilmara’s dayside");
const list = (...notebooks: NotebookListItem[]) => ({ body: { notebooks } });

afterEach(() => vi.unstubAllGlobals());

describe("the list", () => {
  it("shows each notebook with its people, numbers and state, and leads to it", async () => {
    answerWith({ "GET /notebooks": list(ilmara) });
    renderPage(<NotebooksPage groups={[]} />);
    const link = await screen.findByRole("link", { name: ilmara.title });
    expect(link.getAttribute("href")).toBe("/notebooks/a");
    const line = within(screen.getByRole("list", { name: "Notebooks" }));
    expect(line.getByText("Tamsin Orevale")).toBeTruthy();
    expect(line.getByText("one caution")).toBeTruthy();
    expect(line.getByText("239")).toBeTruthy();
    // A rate too small for a number is carried by its logarithm, never shown as zero.
    expect(line.getByText(/−310\.4/)).toBeTruthy();
  });

  it("asks with the filters of its address", async () => {
    const asked = answerWith({ "GET /notebooks": list(ilmara) });
    renderPage(<NotebooksPage groups={[]} />, { at: "/notebooks?q=ilm&order=title" });
    await screen.findByRole("link", { name: ilmara.title });
    expect(asked[0]?.path).toBe("/notebooks?q=ilm&order=title&place=shelf");
  });

  it("searches once typing rests, and says so where nothing is found", async () => {
    const asked = answerWith({
      "GET /notebooks": () => (asked.at(-1)?.path.includes("zzz") ? list() : list(ilmara)),
    });
    renderPage(<NotebooksPage groups={[]} />, { at: "/notebooks" });
    fireEvent.change(await screen.findByLabelText("Search titles and owners"), { target: { value: "zzz" } });
    await screen.findByText(/Nothing with “zzz”/);
    expect(screen.getByTestId("address").textContent).toBe("/notebooks?q=zzz");
    fireEvent.click(screen.getByRole("button", { name: "Show all" }));
    await screen.findByRole("link", { name: ilmara.title });
  });

  it("offers ways to begin where there is nothing yet", async () => {
    answerWith({ "GET /notebooks": list() });
    renderPage(<NotebooksPage groups={[]} />);
    await screen.findByText(/Nothing here yet/);
    expect(screen.getAllByRole("button", { name: "Begin" })).toHaveLength(2);
    expect(screen.getByRole("button", { name: "Import" })).toBeTruthy();
  });

  it("says so where there is no connection, and tries again", async () => {
    answerWith({});
    renderPage(<NotebooksPage groups={[]} />);
    await screen.findByRole("heading", { name: "No connection" });
    answerWith({ "GET /notebooks": list(ilmara) });
    fireEvent.click(screen.getByRole("button", { name: "Try now" }));
    await screen.findByRole("link", { name: ilmara.title });
  });
});

describe("the verbs of a line", () => {
  it("put a notebook into the bin, and back", async () => {
    let isBinned = false;
    answerWith({
      "GET /notebooks": () => (isBinned ? list(notebook("b", "Another")) : list(ilmara)),
      "DELETE /notebooks/a": () => {
        isBinned = true;
        return { status: 204 };
      },
      "POST /notebooks/a/restore-from-bin": () => {
        isBinned = false;
        return { body: {} };
      },
    });
    renderPage(<NotebooksPage groups={[]} />);
    fireEvent.click(await screen.findByRole("button", { name: /More for Escape/ }));
    fireEvent.click(await screen.findByRole("menuitem", { name: "Delete" }));
    await screen.findByText(/is in the bin, for 30 days/);
    await waitFor(() => expect(screen.queryByRole("link", { name: ilmara.title })).toBeNull());
    fireEvent.click(screen.getByRole("button", { name: "Put back" }));
    await screen.findByRole("link", { name: ilmara.title });
  });

  it("are only those that are allowed", async () => {
    const theirs = notebook("a", "Theirs", {
      role: "reader",
      abilities: { ...mayAll, delete: false, rename: false },
    });
    answerWith({ "GET /notebooks": list(theirs) });
    renderPage(<NotebooksPage groups={[]} />);
    fireEvent.click(await screen.findByRole("button", { name: "More for Theirs" }));
    await screen.findByRole("menuitem", { name: "Export as Markdown" });
    expect(screen.queryByRole("menuitem", { name: "Delete" })).toBeNull();
    expect(screen.queryByRole("menuitem", { name: "Rename" })).toBeNull();
  });

  it("duplicate, archive and move", async () => {
    const asked = answerWith({
      "GET /notebooks": list(ilmara),
      "POST /notebooks/a/duplicate": { body: { id: "b" } },
      "POST /notebooks/a/archive": { body: {} },
      "POST /notebooks/a/move": { body: {} },
    });
    renderPage(<NotebooksPage groups={[carrow]} />);
    const choose = async (name: string) => {
      fireEvent.keyDown(await screen.findByRole("button", { name: /^More for Escape/ }), {
        key: "ArrowDown",
      });
      fireEvent.click(await screen.findByRole("menuitem", { name }));
    };
    await choose("Duplicate");
    await screen.findByText(/A copy of .* stands on your own shelf/);
    await choose("Archive");
    await screen.findByText(/is in the archive, to be read only/);
    await choose("Move");
    const dialog = within(await screen.findByRole("dialog", { name: "Move the notebook" }));
    expect(dialog.getByRole("button", { name: "Move" }).hasAttribute("disabled")).toBe(true);
    fireEvent.click(dialog.getByRole("radio", { name: "Carrow Aeronomy" }));
    fireEvent.click(dialog.getByRole("button", { name: "Move" }));
    await screen.findByText(/stands in Carrow Aeronomy now/);
    expect(asked.filter(({ method }) => method === "POST").map(({ path, body }) => [path, body])).toEqual([
      ["/notebooks/a/duplicate", { groupId: null }],
      ["/notebooks/a/archive", {}],
      ["/notebooks/a/move", { groupId: "car" }],
    ]);
  });

  it("look in the archive", async () => {
    const asked = answerWith({ "GET /notebooks": list(ilmara) });
    renderPage(<NotebooksPage groups={[]} />, { at: "/notebooks?place=archived" });
    await screen.findByRole("button", { name: "Where: in the archive" });
    expect(asked[0]!.path).toContain("place=archived");
  });

  it("put back what is in the bin", async () => {
    const binned = notebook("a", "Binned", {
      deletedAt: "2026-03-02T10:00:00.000Z",
      abilities: { ...mayAll, restoreFromBin: true },
    });
    const asked = answerWith({
      "GET /notebooks": list(binned),
      "POST /notebooks/a/restore-from-bin": { body: {} },
    });
    renderPage(<NotebooksPage groups={[]} />, { at: "/notebooks?place=bin" });
    fireEvent.click(await screen.findByRole("button", { name: "Put back Binned" }));
    await waitFor(() => expect(asked.some(({ path }) => path.endsWith("restore-from-bin"))).toBe(true));
    expect(screen.queryByRole("link", { name: "Binned" })).toBeNull();
  });
});

describe("a new notebook", () => {
  async function openDialog() {
    fireEvent.click(await screen.findByRole("button", { name: "New notebook" }));
    return screen.findByRole("dialog", { name: "New notebook" });
  }

  it("begins from the outline on one's own shelf, and is opened", async () => {
    const asked = answerWith({
      "GET /notebooks": list(ilmara),
      "POST /notebooks": { status: 201, body: { id: "new" } },
    });
    renderPage(<NotebooksPage groups={[]} />, { at: "/notebooks" });
    const dialog = within(await openDialog());
    fireEvent.change(dialog.getByLabelText("Title"), { target: { value: " Oda " } });
    fireEvent.click(dialog.getByRole("button", { name: "Begin" }));
    await waitFor(() => expect(screen.getByTestId("address").textContent).toBe("/notebooks/new"));
    const sent = asked.find(({ method }) => method === "POST")?.body;
    expect(sent).toMatchObject({ title: "Oda", groupId: null, document: { title: "Oda", format: 1 } });
  });

  it("needs a title before anything is sent", async () => {
    const asked = answerWith({ "GET /notebooks": list(ilmara) });
    renderPage(<NotebooksPage groups={[]} />);
    const dialog = within(await openDialog());
    fireEvent.click(dialog.getByRole("button", { name: "Begin" }));
    await dialog.findByText("A title is needed.");
    expect(asked.some(({ method }) => method === "POST")).toBe(false);
  });
});

it("names the lines of a file that cannot be imported", async () => {
  const issues = [{ path: "line 31", message: "This block is not closed.", code: "unclosed" }];
  answerWith({
    "GET /notebooks": list(ilmara),
    "POST /notebooks/import": problemAnswer(422, "invalid", "The file cannot be imported.", { issues }),
  });
  renderPage(<NotebooksPage groups={[]} />);
  fireEvent.click(await screen.findByRole("button", { name: "Import a Markdown file" }));
  const dialog = await screen.findByRole("dialog", { name: "Import a Markdown file" });
  const input = dialog.querySelector("input[type=file]");
  fireEvent.change(input!, { target: { files: [new File(["# x"], "oda.md")] } });
  fireEvent.click(within(dialog).getByRole("button", { name: "Import" }));
  const alert = within(await within(dialog).findByRole("alert"));
  expect(alert.getByText("line 31")).toBeTruthy();
  expect(alert.getByText("This block is not closed.")).toBeTruthy();
  expect(alert.getByText(/oda\.md was not imported/)).toBeTruthy();
});
