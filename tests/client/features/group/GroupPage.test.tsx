import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import type { GroupResponse } from "../../../../shared/schemas/groups";
import { GroupPage } from "../../../../src/features/group/GroupPage";
import { answerWith, problemAnswer } from "../../answers";
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
      addMember: isLead,
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

describe("for its lead", () => {
  it("adds a member by address and says under the field why not", async () => {
    answerWith({
      "GET /groups/g": { body: group(true) },
      "POST /groups/g/members": problemAnswer(422, "no_account", "Nobody has an account with this address."),
    });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    const field = await screen.findByLabelText("E-mail of their account");
    fireEvent.change(field, { target: { value: "nobody@lomme.example" } });
    fireEvent.click(screen.getByRole("button", { name: "Add" }));
    await screen.findByText("Nobody has an account with this address.");
    expect(field.getAttribute("aria-invalid")).toBe("true");
  });

  it("sets a role, and keeps the last lead", async () => {
    const asked = answerWith({
      "GET /groups/g": { body: group(true) },
      "PATCH /groups/g/members/p": { body: {} },
    });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    fireEvent.click(await screen.findByRole("button", { name: "Role of Pello Marrash: guest" }));
    fireEvent.click(await screen.findByRole("menuitemradio", { name: /researcher/ }));
    await screen.findByText("Pello Marrash is now researcher.");
    expect(asked.find(({ method }) => method === "PATCH")?.body).toEqual({ role: "researcher" });
    expect(screen.queryByRole("button", { name: /Role of Jorun/ })).toBeNull();
    expect(screen.getByText("the last lead stays")).toBeTruthy();
  });

  it("asks before it removes someone", async () => {
    const asked = answerWith({
      "GET /groups/g": { body: group(true) },
      "DELETE /groups/g/members/p": { status: 204 },
    });
    renderPage(<GroupPage groupId="g" />, { user: jorun });
    fireEvent.click(await screen.findByRole("button", { name: "Remove Pello Marrash" }));
    const dialog = within(await screen.findByRole("dialog", { name: "Remove Pello Marrash" }));
    expect(asked.some(({ method }) => method === "DELETE")).toBe(false);
    fireEvent.click(dialog.getByRole("button", { name: "Remove from the group" }));
    await waitFor(() => expect(asked.some(({ method }) => method === "DELETE")).toBe(true));
  });
});

it("shows a guest who is there, and only the way out", async () => {
  answerWith({ "GET /groups/g": { body: group(false) } });
  renderPage(<GroupPage groupId="g" />, { user: pello });
  await screen.findByText("Jorun Aldaker");
  expect(screen.queryByLabelText("E-mail of their account")).toBeNull();
  expect(screen.queryByRole("button", { name: /Role of/ })).toBeNull();
  expect(screen.getByRole("button", { name: "Leave the group" })).toBeTruthy();
});

it("says not found of a group one may not see", async () => {
  answerWith({ "GET /groups/g": problemAnswer(404, "not_found", "There is no such group.") });
  renderPage(<GroupPage groupId="g" />, { user: pello });
  await screen.findByRole("heading", { name: "Not found" });
  expect(screen.getByText(/share it with p\.marrash@carrow\.example/)).toBeTruthy();
});
