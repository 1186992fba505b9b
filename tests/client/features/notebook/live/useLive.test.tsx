import { act, screen, waitFor } from "@testing-library/react";
import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { LiveEvent } from "../../../../../shared/schemas/live";
import { threadsQuery } from "../../../../../src/features/notebook/comments/commentQueries";
import { HereSentences } from "../../../../../src/features/notebook/live/HereNow";
import { LiveContext } from "../../../../../src/features/notebook/live/liveContext";
import { useLive } from "../../../../../src/features/notebook/live/useLive";
import { answerWith } from "../../../answers";
import { renderPage } from "../../../renderPage";
import { aNotebook, wiremu } from "../aNotebook";

/** Stands in for the browser's stream of events. */
class FakeSource extends EventTarget {
  static readonly CLOSED = 2;
  static opened: FakeSource[] = [];
  readyState = 1;
  onerror: (() => void) | null = null;
  constructor(readonly url: string) {
    super();
    FakeSource.opened.push(this);
  }
  close(): void {
    this.readyState = 2;
  }
  tell(event: LiveEvent): void {
    act(() => {
      this.dispatchEvent(new MessageEvent(event.type, { data: JSON.stringify(event) }));
    });
  }
}

beforeEach(() => {
  FakeSource.opened = [];
  vi.stubGlobal("EventSource", FakeSource);
});
afterEach(() => vi.unstubAllGlobals());

const { cells } = aNotebook();

function Page() {
  const [isConnected, setConnected] = useState(false);
  const live = useLive({ notebookId: "n", ownId: "t", onConnected: setConnected });
  useQuery(threadsQuery("n", null));
  return (
    <LiveContext value={live}>
      <p>{isConnected ? "connected" : "alone"}</p>
      <section aria-label="Margin">
        <HereSentences cells={cells} />
      </section>
      <button onClick={() => live.moveTo("body")}>move</button>
    </LiveContext>
  );
}

function show() {
  const asked = answerWith({
    "GET /notebooks/n/threads": { body: [] },
    "PUT /notebooks/n/presence": { status: 204 },
  });
  renderPage(<Page />);
  const source = FakeSource.opened[0]!;
  source.tell({ type: "opened", connectionId: "c" });
  return { asked, source };
}

const margin = () => screen.getByRole("region", { name: "Margin" }).textContent;

const threadsAsked = (asked: { path: string }[]): number =>
  asked.filter(({ path }) => path.endsWith("/threads")).length;

describe("a live notebook", () => {
  it("reads anew what others have changed", async () => {
    const { asked, source } = show();
    expect(source.url).toBe("/api/notebooks/n/events");
    await waitFor(() => expect(threadsAsked(asked)).toBeGreaterThan(0));
    const before = threadsAsked(asked);
    source.tell({ type: "changed", part: "threads", by: wiremu });
    await waitFor(() => expect(threadsAsked(asked)).toBeGreaterThan(before));
  });

  it("says in a sentence who else is there and at which cell, and not oneself", () => {
    const { source } = show();
    source.tell({
      type: "presence",
      people: [
        { person: { id: "t", name: "Tamsin Orevale" }, cellId: "body" },
        { person: wiremu, cellId: "air" },
      ],
    });
    expect(margin()).toBe("Wiremu Castellane has this notebook open, at column dayside.");
    source.tell({ type: "presence", people: [] });
    expect(margin()).toBe("");
  });

  it("tells where one is, once one rests there", async () => {
    const { asked } = show();
    screen.getByText("move").click();
    await waitFor(() =>
      expect(asked.find(({ method }) => method === "PUT")?.body).toEqual({
        connectionId: "c",
        cellId: "body",
      }),
    );
  });

  it("that is closed by the server shows nobody, and goes on alone", () => {
    const { source } = show();
    expect(screen.getByText("connected")).toBeDefined();
    source.tell({ type: "presence", people: [{ person: wiremu, cellId: null }] });
    source.tell({ type: "closed" });
    expect(source.readyState).toBe(2);
    expect(screen.getByText("alone")).toBeDefined();
    expect(margin()).toBe("");
  });

  it("lets the stream go while the page is hidden, and takes it up again", () => {
    const { source } = show();
    const visibility = vi.spyOn(document, "visibilityState", "get").mockReturnValue("hidden");
    act(() => void document.dispatchEvent(new Event("visibilitychange")));
    expect(source.readyState).toBe(2);
    visibility.mockReturnValue("visible");
    act(() => void document.dispatchEvent(new Event("visibilitychange")));
    expect(FakeSource.opened).toHaveLength(2);
    visibility.mockRestore();
  });
});
