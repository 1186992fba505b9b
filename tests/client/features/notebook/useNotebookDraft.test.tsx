import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act, renderHook, waitFor } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import { servedNotebookActions } from "../../../../shared/schemas/roles";
import { useNotebookDraft } from "../../../../src/features/notebook/draft/useNotebookDraft";
import { aNotebook, withTexts, wiremu } from "./aNotebook";

const tamsin = { id: "tamsin", name: "Tamsin Orevale" };

/** A server that holds one draft, as far as saving is concerned. */
const server = {
  revision: 7,
  document: aNotebook(),
  savedBy: tamsin,
  isOffline: false,
  puts: 0,
};

function answer(body: unknown, status: number): Response {
  return new Response(JSON.stringify(body), { status, headers: { "Content-Type": "application/json" } });
}

async function serve(_path: RequestInfo | URL, init?: RequestInit): Promise<Response> {
  if (server.isOffline) throw new TypeError("no network");
  server.puts += 1;
  const sent = JSON.parse(String(init?.body)) as { revision: number; document: NotebookDocument };
  const savedAt = "2031-04-02T10:42:00.000Z";
  const { revision, document, savedBy } = server;
  if (sent.revision !== revision) {
    const current = { revision, document, savedAt, savedBy };
    const problem = { type: "about:blank", title: "Stale", status: 409, detail: "The draft has moved on." };
    return answer({ ...problem, code: "stale_revision", requestId: "r1", current }, 409);
  }
  server.revision += 1;
  server.document = sent.document;
  server.savedBy = tamsin;
  return answer({ revision: server.revision, savedAt }, 200);
}

function aResponse(): NotebookResponse {
  const abilities = Object.fromEntries(servedNotebookActions.map((action) => [action, true]));
  return {
    id: "ilmara",
    title: server.document.title,
    owner: tamsin,
    group: null,
    role: "owner",
    sharedWith: 1,
    revision: server.revision,
    savedAt: "2031-04-02T10:42:00.000Z",
    savedBy: server.savedBy,
    document: server.document,
    lastVersion: null,
    isArchived: false,
    abilities: abilities as NotebookResponse["abilities"],
  };
}

function open(canEdit = true) {
  const notebook = aResponse();
  const queryClient = new QueryClient();
  return renderHook(() => useNotebookDraft({ notebook, person: tamsin, canEdit }), {
    wrapper: ({ children }) => <QueryClientProvider client={queryClient}>{children}</QueryClientProvider>,
  });
}

const write = (page: ReturnType<typeof open>, id: string, text: string) =>
  act(() => page.result.current.edit({ type: "changeText", id, text }));
const serverText = (id: string) => server.document.cells.find((cell) => cell.id === id)?.text;

beforeEach(() => {
  Object.assign(server, { revision: 7, document: aNotebook(), savedBy: tamsin, isOffline: false, puts: 0 });
  vi.stubGlobal("fetch", serve);
});
afterEach(() => {
  vi.unstubAllGlobals();
  localStorage.clear();
  sessionStorage.clear();
});

describe("useNotebookDraft", () => {
  it("saves what is written, by itself, once it rests", async () => {
    const page = open();
    write(page, "text", "New.");
    expect(page.result.current.saveState.kind).toBe("saving");
    await waitFor(() => expect(page.result.current.saveState.kind).toBe("saved"), { timeout: 3_000 });
    expect(serverText("text")).toBe("New.");
    expect(page.result.current.draft.agreed.revision).toBe(8);
    expect(server.puts).toBe(1);
  });

  it("shows both states of what someone else changed meanwhile, and saves what is chosen", async () => {
    const page = open();
    server.document = withTexts(server.document, { text: "Theirs.", body: "mass = 1 earth_mass" });
    server.revision = 8;
    server.savedBy = wiremu;
    write(page, "text", "Mine.");
    await waitFor(() => expect(page.result.current.merge).not.toBeNull(), { timeout: 3_000 });
    expect(page.result.current.merge!.conflicts).toMatchObject([{ mine: "Mine.", theirs: "Theirs." }]);
    expect(serverText("text")).toBe("Theirs.");

    act(() => page.result.current.settling.chooseAll("mine"));
    act(() => page.result.current.settling.settle());
    await waitFor(() => expect(serverText("text")).toBe("Mine."), { timeout: 3_000 });
    expect(serverText("body")).toBe("mass = 1 earth_mass");
    expect(server.revision).toBe(9);
  });

  it("keeps in the browser what can't be saved, and takes it up on the next visit", async () => {
    server.isOffline = true;
    const first = open();
    write(first, "text", "Written on a train.");
    await waitFor(
      () => expect(first.result.current.saveState).toMatchObject({ kind: "kept", reason: "offline" }),
      {
        timeout: 3_000,
      },
    );
    expect(Object.keys(localStorage)).toHaveLength(1);
    first.unmount();

    server.isOffline = false;
    const second = open();
    await waitFor(() => expect(serverText("text")).toBe("Written on a train."), { timeout: 3_000 });
    await waitFor(() => expect(second.result.current.saveState.kind).toBe("saved"), { timeout: 3_000 });
    await waitFor(() => expect(Object.keys(localStorage)).toHaveLength(0));
  });

  it("loses nothing when the page is left before writing rests", async () => {
    const page = open();
    await act(() => new Promise((rest) => setTimeout(rest, 20)));
    server.isOffline = true;
    write(page, "text", "Left in a hurry.");
    page.unmount();
    const [kept] = Object.keys(localStorage);
    expect(localStorage.getItem(kept!)).toContain("Left in a hurry.");
  });

  it("saves at once when a version is about to be kept", async () => {
    const page = open();
    await act(() => Promise.resolve());
    write(page, "text", "To be kept.");
    let revision: number | null = null;
    await act(async () => {
      revision = await page.result.current.flush();
    });
    expect(revision).toBe(8);
    expect(serverText("text")).toBe("To be kept.");
  });

  it("sends nothing for those who may only read", async () => {
    const page = open(false);
    await act(() => new Promise((rest) => setTimeout(rest, 50)));
    expect(page.result.current.saveState.kind).toBe("saved");
    expect(server.puts).toBe(0);
  });
});
