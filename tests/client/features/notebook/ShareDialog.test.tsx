import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import { servedNotebookActions } from "../../../../shared/schemas/roles";
import type { SharesResponse } from "../../../../shared/schemas/shares";
import { ShareDialog } from "../../../../src/features/notebook/sharing/ShareDialog";
import { answerWith, problemAnswer, type Answers } from "../../answers";
import { renderPage } from "../../renderPage";

const tamsin = { id: "t", name: "Tamsin Orevale", email: "t.orevale@carrow.example" };
const wiremu = { id: "w", name: "Wiremu Castellane", email: "w.castellane@carrow.example" };

const notebook = (isOwner: boolean): NotebookResponse => ({
  id: "n",
  title: "Nirel, a first look",
  owner: { id: "t", name: tamsin.name },
  group: { id: "g", name: "Carrow Aeronomy", code: "CAR" },
  role: isOwner ? "owner" : "co-author",
  sharedWith: 4,
  revision: 1,
  savedAt: "2026-11-12T14:31:00.000Z",
  savedBy: { id: "t", name: tamsin.name },
  document: { format: 1, title: "Nirel", unitSystem: "SI", headline: [], authors: [], cells: [] },
  lastVersion: null,
  isArchived: false,
  abilities: Object.fromEntries(
    servedNotebookActions.map((action) => [action, action === "leave" ? !isOwner : isOwner]),
  ) as NotebookResponse["abilities"],
});

const shares = (isOwner: boolean): SharesResponse => ({
  owner: { id: "t", name: tamsin.name },
  people: [
    {
      user: { id: "w", name: wiremu.name },
      role: "co-author",
      since: "2026-10-02T09:00:00.000Z",
      groupRole: "researcher",
    },
    {
      user: { id: "p", name: "Pello Marrash" },
      role: "reader",
      since: "2026-10-02T09:00:00.000Z",
      groupRole: null,
    },
  ],
  invitations: isOwner
    ? [
        {
          id: "i",
          email: "n.harcourt@vell.example",
          role: "commenter",
          invitedBy: { id: "t", name: tamsin.name },
          invitedAt: "2026-12-01T09:00:00.000Z",
          expiresAt: "2026-12-15T09:00:00.000Z",
          hasLapsed: false,
        },
      ]
    : [],
  group: { id: "g", name: "Carrow Aeronomy", role: null, people: 5, guests: 1 },
});

afterEach(() => vi.unstubAllGlobals());

function open(isOwner: boolean, answers: Answers = {}) {
  const asked = answerWith({ "GET /notebooks/n/shares": { body: shares(isOwner) }, ...answers });
  const onLeft = vi.fn();
  renderPage(<ShareDialog notebook={notebook(isOwner)} onClose={() => undefined} onLeft={onLeft} />, {
    user: isOwner ? tamsin : wiremu,
  });
  const sent = () =>
    asked.filter(({ method }) => method !== "GET").map(({ method, path, body }) => [method, path, body]);
  return { sent, onLeft };
}

describe("for its owner", () => {
  it("lists people, invitations and the group, and says what each may become", async () => {
    open(true);
    const list = within(await screen.findByRole("list", { name: "Who may see it" }));
    expect(list.getAllByRole("listitem")).toHaveLength(5);
    list.getByText("researcher in Carrow Aeronomy, since 2 October", { exact: false });
    list.getByText(/no answer yet; lapses on 15 December/);
    list.getByText(/five people, one guest among them/);
  });

  it("shares by address, and says under the field why not", async () => {
    const { sent } = open(true, {
      "POST /notebooks/n/shares": problemAnswer(409, "already_shared", "They have it already."),
    });
    const form = within(await screen.findByRole("form", { name: "Share with someone" }));
    const field = form.getByLabelText("Share with, by e-mail");
    fireEvent.click(form.getByRole("button", { name: "Share" }));
    await form.findByText(/This is not an e-mail address/);
    expect(sent()).toEqual([]);
    fireEvent.change(field, { target: { value: "i.brandvold@carrow.example" } });
    fireEvent.click(form.getByRole("button", { name: "Share" }));
    await form.findByText("They have it already.");
    expect(sent()[0]![2]).toEqual({ email: "i.brandvold@carrow.example", role: "commenter" });
  });

  it("changes roles, takes back, sends again, and shares with the group", async () => {
    const { sent } = open(true, {
      "PATCH /notebooks/n/shares/w": { body: shares(true) },
      "DELETE /notebooks/n/shares/p": { status: 204 },
      "POST /notebooks/n/invitations/i/send-again": { body: shares(true) },
      "PUT /notebooks/n/group-share": { body: shares(true) },
    });
    fireEvent.click(await screen.findByRole("button", { name: "Role of Wiremu Castellane: co-author" }));
    fireEvent.click(await screen.findByRole("menuitemradio", { name: /^reader/ }));
    await screen.findByText("Wiremu Castellane is now reader.");
    fireEvent.click(screen.getByRole("button", { name: "Take back from Pello Marrash" }));
    await screen.findByText(/Pello Marrash no longer sees it in person/);
    fireEvent.click(screen.getByRole("button", { name: /Send again the invitation of n\.harcourt/ }));
    await screen.findByText(/has a new letter/);
    fireEvent.click(screen.getByRole("button", { name: "Share with all" }));
    await screen.findByText("The group may read it.");
    expect(sent()).toEqual([
      ["PATCH", "/notebooks/n/shares/w", { role: "reader" }],
      ["DELETE", "/notebooks/n/shares/p", undefined],
      ["POST", "/notebooks/n/invitations/i/send-again", {}],
      ["PUT", "/notebooks/n/group-share", { role: "reader" }],
    ]);
  });

  it("hands it over, within a group only to those who may write there", async () => {
    const { sent } = open(true, { "POST /notebooks/n/hand-over": { body: {} } });
    fireEvent.click(await screen.findByRole("button", { name: "Hand over" }));
    fireEvent.click(await screen.findByRole("button", { name: "The new owner: Wiremu Castellane" }));
    expect(await screen.findAllByRole("menuitemradio")).toHaveLength(1);
    fireEvent.click(screen.getByRole("menuitemradio", { name: /Wiremu/ }));
    fireEvent.click(await screen.findByRole("button", { name: "Hand over" }));
    await screen.findByText(/Wiremu Castellane owns it now/);
    expect(sent()).toEqual([["POST", "/notebooks/n/hand-over", { userId: "w" }]]);
  });
});

describe("for a co-author", () => {
  it("only shows who sees it, and lets them give up their own part", async () => {
    const { sent, onLeft } = open(false, { "DELETE /notebooks/n/shares/w": { status: 204 } });
    await screen.findByText("Pello Marrash");
    expect(screen.queryByRole("form")).toBeNull();
    expect(screen.queryByRole("button", { name: /Role of|Take back|Hand over|Share with all/ })).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: "Give up" }));
    await waitFor(() => expect(onLeft).toHaveBeenCalled());
    expect(sent()).toEqual([["DELETE", "/notebooks/n/shares/w", undefined]]);
  });
});

it("says what went wrong and tries again", async () => {
  answerWith({ "GET /notebooks/n/shares": problemAnswer(500, "internal", "Something went wrong here.") });
  renderPage(<ShareDialog notebook={notebook(true)} onClose={() => undefined} onLeft={() => undefined} />, {
    user: tamsin,
  });
  await screen.findByText("Something went wrong here.");
  expect(screen.getByRole("button", { name: "Try again" })).toBeTruthy();
});
