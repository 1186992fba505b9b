import { fireEvent, screen, waitFor } from "@testing-library/react";
import { afterEach, expect, it, vi } from "vitest";
import { choosableMailKinds, type MailChoicesResponse } from "../../../../shared/schemas/mail";
import { MailChoices } from "../../../../src/features/account/MailChoices";
import { answerWith, problemAnswer } from "../../answers";
import { renderPage } from "../../renderPage";

const all = Object.fromEntries(choosableMailKinds.map((kind) => [kind, true])) as MailChoicesResponse;

afterEach(() => vi.unstubAllGlobals());

it("switches one kind of mail off and shows what the server then says", async () => {
  const asked = answerWith({
    "GET /account/mail": { body: all },
    "PATCH /account/mail": { body: { ...all, reply: false } },
  });
  renderPage(<MailChoices />);
  const replies = await screen.findByRole<HTMLInputElement>("checkbox", { name: "replies to my comments" });
  expect(screen.getAllByRole("checkbox")).toHaveLength(choosableMailKinds.length);
  expect(replies.checked).toBe(true);
  fireEvent.click(replies);
  await waitFor(() => expect(replies.checked).toBe(false));
  expect(asked.at(-1)!.body).toEqual({ kind: "reply", isWanted: false });
});

it("leaves the switch as it was where the change fails, and says so", async () => {
  answerWith({
    "GET /account/mail": { body: all },
    "PATCH /account/mail": problemAnswer(500, "internal", "Something went wrong here."),
  });
  renderPage(<MailChoices />);
  const replies = await screen.findByRole<HTMLInputElement>("checkbox", { name: "replies to my comments" });
  fireEvent.click(replies);
  await screen.findByText("Something went wrong here.");
  expect(replies.checked).toBe(true);
});
