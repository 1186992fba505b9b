import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { AuditResponse } from "../../../../shared/schemas/audit";
import type { GroupResponse } from "../../../../shared/schemas/groups";
import type { GroupInvitation } from "../../../../shared/schemas/invitations";
import { GroupPage } from "../../../../src/features/group/GroupPage";
import { answerWith, problemAnswer, type Asked } from "../../answers";
import { renderPage } from "../../renderPage";

const jorun = { id: "j", name: "Jorun Aldaker", email: "j.aldaker@carrow.example" };
const pello = { id: "p", name: "Pello Marrash", email: "p.marrash@carrow.example" };

function group(isLead: boolean): GroupResponse {
  return {
    id: "g",
    name: "Carrow Aeronomy",
    code: "CAR",
    role: isLead ? "lead" : "guest",
    members: 2,
    abilities: {
      see: true,
      createNotebook: isLead,
      rename: isLead,
      invite: isLead,
      revokeInvitation: isLead,
      handOver: isLead,
      seeAudit: isLead,
      seeReferences: true,
      seeQueue: isLead,
      setRole: isLead,
      removeMember: isLead,
      leave: !isLead,
    },
    foundedAt: "2026-01-14T09:00:00.000Z",
    memberList: [
      { user: { id: "j", name: jorun.name }, role: "lead", joinedAt: "2026-01-14T09:00:00.000Z" },
      { user: { id: "p", name: pello.name }, role: "guest", joinedAt: "2026-02-02T09:00:00.000Z" },
    ],
  };
}

afterEach(() => vi.unstubAllGlobals());

const invited: GroupInvitation = {
  id: "i",
  email: "l.verrano@lomme.example",
  role: "guest",
  invitedBy: { id: "j", name: jorun.name },
  invitedAt: "2026-12-01T09:00:00.000Z",
  expiresAt: "2026-12-15T09:00:00.000Z",
  hasLapsed: false,
};

const trail: AuditResponse = {
  lines: [
    {
      id: 9,
      at: "2026-11-12T14:31:00.000Z",
      by: { id: "j", name: jorun.name },
      act: "role_set",
      subject: { kind: "person", id: "p", name: pello.name },
      details: { role: "guest", before: "researcher" },
    },
    {
      id: 8,
      at: "2026-11-11T14:31:00.000Z",
      by: { id: "p", name: pello.name },
      act: "notebook_archived",
      subject: { kind: "notebook", id: "n", name: "Nirel, a first look" },
      details: {},
    },
  ],
  total: 3,
  next: 8,
};

/** What the page of a lead asks for besides the group. */
const forLead = {
  "GET /groups/g": { body: group(true) },
  "GET /groups/g/invitations": { body: [invited] },
  "GET /groups/g/audit": { body: trail },
};

describe("for its lead", () => {
  it("invites by address and says under the field why not", async () => {
    answerWith({
      ...forLead,
      "POST /groups/g/invitations": problemAnswer(409, "already_invited", "This address is invited already."),
    });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    const form = within(await screen.findByRole("form", { name: "Invite someone" }));
    const field = form.getByLabelText("E-mail");
    fireEvent.click(form.getByRole("button", { name: "Invite" }));
    await screen.findByText(/This is not an e-mail address/);
    fireEvent.change(field, { target: { value: "l.verrano@lomme.example" } });
    fireEvent.click(form.getByRole("button", { name: "Invite" }));
    await screen.findByText("This address is invited already.");
    expect(field.getAttribute("aria-invalid")).toBe("true");
  });

  it("lists who has not answered; sends again and takes back", async () => {
    const asked = answerWith({
      ...forLead,
      "POST /groups/g/invitations/i/send-again": { body: [] },
      "DELETE /groups/g/invitations/i": { status: 204 },
    });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    await screen.findByText("no answer yet");
    fireEvent.click(screen.getByRole("button", { name: /Send the invitation of l\.verrano/ }));
    await screen.findByText(/has a new letter/);
    fireEvent.click(screen.getByRole("button", { name: /Take back the invitation of l\.verrano/ }));
    await screen.findByText(/is taken back/);
    expect(asked.filter(({ method }) => method !== "GET").map(({ method, path }) => [method, path])).toEqual([
      ["POST", "/groups/g/invitations/i/send-again"],
      ["DELETE", "/groups/g/invitations/i"],
    ]);
  });

  it("tells what has happened in sentences, filtered, page by page, and as a table", async () => {
    const asked: Asked[] = answerWith({
      ...forLead,
      "GET /groups/g/audit": () => ({
        body: asked.at(-1)!.path.includes("before=8")
          ? { ...trail, lines: [{ ...trail.lines[0]!, id: 7 }], next: null }
          : trail,
      }),
    });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    const lines = await screen.findByRole("list", { name: /What has happened/ });
    expect(lines.textContent).toContain("Jorun Aldaker made Pello Marrash guest; was researcher");
    expect(within(lines).getByRole("link", { name: "Nirel, a first look" }).getAttribute("href")).toBe(
      "/notebooks/n",
    );
    fireEvent.click(screen.getByRole("button", { name: "Earlier" }));
    await waitFor(() => expect(within(lines).getAllByRole("listitem")).toHaveLength(3));
    expect(screen.queryByRole("button", { name: "Earlier" })).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: "To what: anything" }));
    fireEvent.click(await screen.findByRole("menuitemradio", { name: /notebooks/ }));
    await waitFor(() =>
      expect(asked.some(({ path }) => path === "/groups/g/audit?kind=notebooks")).toBe(true),
    );
    const table = screen.getByRole("link", { name: /CSV/ });
    expect(table.getAttribute("href")).toBe("/api/groups/g/audit.csv?kind=notebooks");
  });

  it("hands the lead over to another member", async () => {
    const asked = answerWith({ ...forLead, "POST /groups/g/hand-over": { body: {} } });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    fireEvent.click(await screen.findByRole("button", { name: "Hand over" }));
    const dialog = within(await screen.findByRole("dialog", { name: "Hand Carrow Aeronomy over" }));
    fireEvent.click(dialog.getByRole("button", { name: "Hand over" }));
    await screen.findByText(/Pello Marrash now leads Carrow Aeronomy/);
    expect(asked.find(({ method }) => method === "POST")?.body).toEqual({ userId: "p" });
  });

  it("gives the group another name", async () => {
    const asked = answerWith({ ...forLead, "PATCH /groups/g": { body: {} } });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    fireEvent.click(await screen.findByRole("button", { name: "Rename" }));
    const dialog = within(await screen.findByRole("dialog", { name: "Rename the group" }));
    fireEvent.change(dialog.getByLabelText("Name"), { target: { value: "Carrow" } });
    fireEvent.click(dialog.getByRole("button", { name: "Rename" }));
    await waitFor(() =>
      expect(asked.find(({ method }) => method === "PATCH")?.body).toEqual({ name: "Carrow" }),
    );
  });

  it("sets a role, and keeps the last lead", async () => {
    const asked = answerWith({
      ...forLead,
      "PATCH /groups/g/members/p": { body: {} },
    });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    fireEvent.click(await screen.findByRole("button", { name: "Role of Pello Marrash: guest" }));
    fireEvent.click(await screen.findByRole("menuitemradio", { name: /researcher/ }));
    await screen.findByText("Pello Marrash is now researcher.");
    expect(asked.find(({ method }) => method === "PATCH")?.body).toEqual({ role: "researcher" });
    expect(screen.queryByRole("button", { name: /Role of Jorun/ })).toBeNull();
  });

  it("asks before it removes someone, and says what becomes of their notebooks", async () => {
    const asked = answerWith({
      ...forLead,
      "GET /groups/g/members/p/notebooks": { body: { notebooks: 2, goTo: { id: "j", name: jorun.name } } },
      "DELETE /groups/g/members/p": { status: 204 },
    });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    fireEvent.click(await screen.findByRole("button", { name: "Remove Pello Marrash" }));
    const dialog = within(await screen.findByRole("dialog", { name: "Remove Pello Marrash" }));
    expect(asked.some(({ method }) => method === "DELETE")).toBe(false);
    await dialog.findByText(/Pello Marrash’s two notebooks in the group.* stay and become yours/);
    fireEvent.click(dialog.getByRole("button", { name: "Remove from the group" }));
    await waitFor(() => expect(asked.some(({ method }) => method === "DELETE")).toBe(true));
  });
});

it("shows a guest who is there, and only the way out", async () => {
  answerWith({ "GET /groups/g": { body: group(false) } });
  renderPage(<GroupPage groupId="g" />, { user: pello });
  await screen.findByText("Jorun Aldaker");
  expect(screen.queryByRole("form", { name: "Invite someone" })).toBeNull();
  expect(screen.queryByText("What has happened")).toBeNull();
  expect(screen.queryByRole("button", { name: /Role of/ })).toBeNull();
  expect(screen.getByRole("button", { name: "Leave the group" })).toBeTruthy();
});

it("says not found of a group one may not see", async () => {
  answerWith({ "GET /groups/g": problemAnswer(404, "not_found", "There is no such group.") });
  renderPage(<GroupPage groupId="g" />, { user: pello });
  await screen.findByRole("heading", { name: "Not found" });
  expect(screen.getByText(/share it with p\.marrash@carrow\.example/)).toBeTruthy();
});
