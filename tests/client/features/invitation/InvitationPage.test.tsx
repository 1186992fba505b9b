import { fireEvent, screen, waitFor } from "@testing-library/react";
import { afterEach, expect, it, vi } from "vitest";
import type { InvitationResponse } from "../../../../shared/schemas/invitations";
import { InvitationPage } from "../../../../src/features/invitation/InvitationPage";
import { answerWith, problemAnswer } from "../../answers";
import { renderPage } from "../../renderPage";

const lio = { id: "l", name: "Lio Verrano", email: "l.verrano@lomme.example" };
const pello = { id: "p", name: "Pello Marrash", email: "p.marrash@carrow.example" };
const token = "t".repeat(43);

const invitation: InvitationResponse = {
  to: "group",
  name: "Carrow Aeronomy",
  role: "guest",
  email: lio.email,
  invitedBy: "Jorun Aldaker",
  expiresAt: "2026-12-15T09:00:00.000Z",
};
const open = { "POST /invitations/look": { body: invitation } };

afterEach(() => vi.unstubAllGlobals());

it("is accepted by the person it is for, and leads to what it opens", async () => {
  const asked = answerWith({ ...open, "POST /invitations/accept": { body: { to: "group", id: "g" } } });
  renderPage(<InvitationPage token={token} account={lio} />, { user: lio });
  await screen.findByText("Jorun Aldaker invites you to the group, as a guest.");
  fireEvent.click(screen.getByRole("button", { name: "Accept" }));
  await waitFor(() => expect(screen.getByTestId("address").textContent).toBe("/groups/g"));
  expect(asked.at(-1)).toMatchObject({ path: "/invitations/accept", body: { token } });
});

it("tells another person whom it is for, and offers nothing to accept", async () => {
  answerWith(open);
  renderPage(<InvitationPage token={token} account={pello} />, { user: pello });
  await screen.findByText(/You are signed in as p\.marrash@carrow\.example/);
  expect(screen.queryByRole("button", { name: "Accept" })).toBeNull();
});

it("leads a stranger to an account, with the invitation", async () => {
  answerWith(open);
  renderPage(<InvitationPage token={token} account={null} />);
  const create = await screen.findByRole("link", { name: "Create an account" });
  expect(create.getAttribute("href")).toBe(`/accounts/new#${token}`);
  const signIn = screen.getByRole("link", { name: "I have an account" });
  expect(signIn.getAttribute("href")).toBe(`/invitation/open#${token}`);
});

it("says why it is not open any more", async () => {
  answerWith({
    "POST /invitations/look": problemAnswer(409, "invitation_lapsed", "This invitation is over. Ask again."),
  });
  renderPage(<InvitationPage token={token} account={null} />);
  await screen.findByRole("heading", { name: "This invitation is not open" });
  expect(screen.getByText("This invitation is over. Ask again.")).toBeTruthy();
});
