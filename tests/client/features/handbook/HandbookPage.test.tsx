import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { engineVersion } from "../../../../shared/notebook/engine";
import { handbookBodies, handbookGases, references } from "../../../../shared/physics";
import { HandbookPage } from "../../../../src/features/handbook/HandbookPage";
import { answerWith, problemAnswer } from "../../answers";
import { renderPage } from "../../renderPage";

const tamsin = { id: "t", name: "Tamsin Orevale", email: "t.orevale@carrow.example" };

beforeEach(() => {
  window.HTMLElement.prototype.scrollIntoView = () => undefined;
});
afterEach(() => vi.unstubAllGlobals());

const rowsOf = (name: string) => within(screen.getByRole("table", { name })).getAllByRole("row").slice(1);
const rowOf = (table: string, name: string) =>
  within(
    within(screen.getByRole("table", { name: table }))
      .getByRole("rowheader", { name })
      .closest("tr")!,
  );

describe("the handbook", () => {
  it("shows everything to a stranger, and names the engine", () => {
    renderPage(<HandbookPage />);
    expect(screen.getByText(new RegExp(`engine ${engineVersion.replace(/\./g, "\\.")}`))).toBeTruthy();
    expect(rowsOf("Bodies")).toHaveLength(handbookBodies.length);
    expect(rowsOf("Gases")).toHaveLength(handbookGases.length);
    for (const title of ["Collision parameters", "Kinetic corrections", "Recombination", "Constants"])
      expect(screen.getByRole("heading", { name: title })).toBeTruthy();
  });

  it("shows one section at its address, in the units asked for", () => {
    renderPage(<HandbookPage />, { at: "/handbook?show=bodies&units=cgs" });
    expect(screen.queryByRole("table", { name: "Gases" })).toBeNull();
    // GM of Mars, 42 828.37 km³/s² (NAIF kernel gm_de440): 4.282837e19 cm³/s².
    expect(rowOf("Bodies", "Mars").getByText(/4\.282837/).textContent).toMatch(/19/);
  });

  it("numbers each value's source and gives it in full beside the table", () => {
    renderPage(<HandbookPage />, { at: "/handbook?show=bodies" });
    const link = rowOf("Bodies", "Mars").getAllByRole("link", { name: /^source \d+$/ })[1]!;
    const target = document.getElementById(link.getAttribute("href")!.slice(1))!;
    expect(target.textContent).toContain(references["Archinal2018"]);
    expect(target.textContent).toContain("mean radius, from memory");
  });

  it("says in words what is borrowed from another gas", () => {
    renderPage(<HandbookPage />, { at: "/handbook?show=gases" });
    expect(rowOf("Gases", "He").getByText("published")).toBeTruthy();
    expect(rowOf("Gases", "D").getByText("d and α by analogy")).toBeTruthy();
  });

  it("finds by formula and by name, and says so where there is nothing", async () => {
    renderPage(<HandbookPage />, { at: "/handbook?q=mars" });
    expect(rowsOf("Bodies")).toHaveLength(1);
    fireEvent.change(screen.getByLabelText("Search names and formulas"), { target: { value: "he" } });
    await waitFor(() => expect(screen.queryByRole("table", { name: "Bodies" })).toBeNull());
    // The formula He, not every name that begins with it.
    expect(rowsOf("Gases")).toHaveLength(1);
    fireEvent.change(screen.getByLabelText("Search names and formulas"), { target: { value: "zzz" } });
    await screen.findByText(/Nothing in the handbook with “zzz”/);
    fireEvent.click(screen.getByRole("button", { name: "Show everything" }));
    await screen.findByRole("table", { name: "Bodies" });
  });

  it("folds estimated pairs away until they are asked for", async () => {
    renderPage(<HandbookPage />, { at: "/handbook?show=collisions&q=kr" });
    expect(screen.queryByRole("table")).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: "All pairs" }));
    const rows = rowsOf("Pairs without one, estimated from the masses");
    expect(rows).toHaveLength(handbookGases.length - 1);
    expect(within(rows[0]!).getByText("estimated")).toBeTruthy();
    expect(screen.getByTestId("address").textContent).toContain("pairs=all");
  });

  it("lists other laws of a pair under the one that acts", () => {
    renderPage(<HandbookPage />, { at: "/handbook?show=collisions" });
    const rows = rowsOf("Pairs with a measured law").map((row) => within(row));
    const at = rows.findIndex((row) => row.queryByRole("rowheader", { name: "H2 in N2" }));
    // First measured row, b = 1.41e21 m⁻¹ s⁻¹ at 200 K: 2.8e19 × 200^0.74 (Marrero and Mason 1972).
    expect(rows[at]!.getByText(/1\.41/)).toBeTruthy();
    expect(rows[at + 1]!.getByRole("rowheader", { name: "also for H2 in N2" })).toBeTruthy();
    expect(rows[at + 1]!.queryByRole("button")).toBeNull();
  });
});

const mayAll = {
  read: true,
  export: true,
  edit: true,
  rename: true,
  keepVersion: true,
  restoreVersion: true,
  delete: true,
  restoreFromBin: false,
  requestVetting: false,
  answerCautions: false,
};
const listed = (id: string, title: string, edit: boolean) => ({
  id,
  title,
  owner: { id: "t", name: "Tamsin Orevale" },
  coAuthors: [],
  group: null,
  role: edit ? "owner" : "reader",
  revision: 4,
  savedAt: "2026-03-01T10:00:00.000Z",
  lastVersion: null,
  summary: null,
  deletedAt: null,
  abilities: { ...mayAll, edit },
});
const list = { body: { notebooks: [listed("r", "To read", false), listed("w", "Oda", true)] } };
const gasH = { id: "1", kind: "gas", name: "H", text: "" };
const notebook = (revision: number, cells: object[] = []) => ({
  body: {
    id: "w",
    title: "Oda",
    owner: { id: "t", name: "Tamsin Orevale" },
    group: null,
    role: "owner",
    sharedWith: 0,
    revision,
    savedAt: "2026-03-01T10:00:00.000Z",
    savedBy: { id: "t", name: "Tamsin Orevale" },
    document: { format: 1, title: "Oda", unitSystem: "SI", headline: [], authors: [], cells },
    lastVersion: null,
    abilities: mayAll,
  },
});
const saved = { body: { revision: 9, savedAt: "2026-03-01T10:05:00.000Z" } };
const stale = problemAnswer(409, "stale_revision", "The draft has moved on.");

async function openFor(name: string, at = "/handbook?show=bodies") {
  renderPage(<HandbookPage />, { at, user: tamsin });
  fireEvent.click(screen.getByRole("button", { name: `Put into a notebook: ${name}` }));
  return within(await screen.findByRole("dialog", { name: "Put into a notebook" }));
}

describe("putting a row into a notebook", () => {
  it("offers the notebooks one may write in, and appends the cell on the revision it read", async () => {
    const asked = answerWith({
      "GET /notebooks": list,
      "GET /notebooks/w": notebook(4, [gasH]),
      "PUT /notebooks/w/draft": saved,
    });
    const dialog = await openFor("Mars");
    await dialog.findByRole("radio", { name: "Oda" });
    expect(dialog.queryByRole("radio", { name: /To read/ })).toBeNull();
    fireEvent.click(dialog.getByRole("radio", { name: "with its numbers written out" }));
    fireEvent.click(dialog.getByRole("button", { name: "Put it in" }));
    await screen.findByText("The body cell mars stands in “Oda”.");
    const body = asked.find(({ method }) => method === "PUT")?.body;
    expect(body).toMatchObject({ revision: 4, document: { cells: [{ name: "H" }, { name: "mars" }] } });
    expect(JSON.stringify(body)).toContain("radius          = 3389.5 km");
  });

  it("begins again from what someone else has just saved, once", async () => {
    let tries = 0;
    const asked = answerWith({
      "GET /notebooks": list,
      "GET /notebooks/w": () => notebook(4 + tries),
      "PUT /notebooks/w/draft": () => (++tries === 1 ? stale : saved),
    });
    const dialog = await openFor("Mars");
    await dialog.findByRole("radio", { name: "Oda" });
    fireEvent.click(dialog.getByRole("button", { name: "Put it in" }));
    await screen.findByText(/stands in “Oda”/);
    expect(asked.filter(({ method }) => method === "PUT").map(({ body }) => body)).toMatchObject([
      { revision: 4 },
      { revision: 5 },
    ]);
  });

  it("says so where that is overtaken too, and puts nothing in", async () => {
    const asked = answerWith({
      "GET /notebooks": list,
      "GET /notebooks/w": notebook(4),
      "PUT /notebooks/w/draft": stale,
    });
    const dialog = await openFor("Mars");
    await dialog.findByRole("radio", { name: "Oda" });
    fireEvent.click(dialog.getByRole("button", { name: "Put it in" }));
    await dialog.findByText(/twice in a row\. Nothing was put in/);
    expect(asked.filter(({ method }) => method === "PUT")).toHaveLength(2);
  });

  it("gives no gas a second cell, and sends nothing", async () => {
    const asked = answerWith({ "GET /notebooks": list, "GET /notebooks/w": notebook(4, [gasH]) });
    const dialog = await openFor("H", "/handbook?show=gases");
    await dialog.findByRole("radio", { name: "Oda" });
    fireEvent.click(dialog.getByRole("button", { name: "Put it in" }));
    await dialog.findByText(/has a cell of the gas H already/);
    expect(asked.some(({ method }) => method === "PUT")).toBe(false);
  });

  it("lets a stranger copy the entries", async () => {
    const writeText = vi.fn(() => Promise.resolve());
    vi.stubGlobal("navigator", { ...navigator, clipboard: { writeText } });
    renderPage(<HandbookPage />, { at: "/handbook?show=bodies&q=titan" });
    fireEvent.click(screen.getByRole("button", { name: "Put into a notebook: Titan" }));
    const dialog = within(await screen.findByRole("dialog", { name: "Put into a notebook" }));
    expect(dialog.getByRole("link", { name: "Sign in" })).toBeTruthy();
    expect(dialog.queryByRole("button", { name: "Put it in" })).toBeNull();
    fireEvent.click(dialog.getByRole("button", { name: "Copy the entries" }));
    await dialog.findByText("Copied.");
    expect(writeText).toHaveBeenCalledWith("like = handbook(Titan)");
  });
});
