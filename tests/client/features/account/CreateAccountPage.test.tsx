import { fireEvent, screen, waitFor } from "@testing-library/react";
import { afterEach, expect, it, vi } from "vitest";
import { CreateAccountPage } from "../../../../src/features/account/CreateAccountPage";
import { answerWith, problemAnswer } from "../../answers";
import { renderPage } from "../../renderPage";

afterEach(() => vi.unstubAllGlobals());

function fillIn(fields: Record<string, string>) {
  for (const [label, value] of Object.entries(fields)) {
    fireEvent.change(screen.getByLabelText(label), { target: { value } });
  }
  fireEvent.submit(screen.getByRole("form", { name: "Create an account" }));
}

const whole = {
  Name: "Oswin Tarrabel",
  "E-mail": "O.Tarrabel@lomme.example",
  Password: "a few words make one",
};

it("complains beside the field before anything is sent", () => {
  const asked = answerWith({});
  renderPage(<CreateAccountPage onSignedIn={vi.fn()} />);
  fillIn({ ...whole, Password: "short" });
  const field = screen.getByLabelText("Password");
  expect(field.getAttribute("aria-invalid")).toBe("true");
  const note = document.getElementById(field.getAttribute("aria-describedby") ?? "");
  expect(note?.textContent).toContain("at least 12 characters");
  expect(screen.getByLabelText("Name").getAttribute("aria-invalid")).toBeNull();
  expect(asked).toEqual([]);
});

it("puts the server's complaint beside the field it speaks of", async () => {
  const issues = [{ path: "email", message: "This address has an account. Sign in instead.", code: "taken" }];
  answerWith({ "POST /accounts": problemAnswer(409, "address_taken", "Not possible.", { issues }) });
  renderPage(<CreateAccountPage onSignedIn={vi.fn()} />);
  fillIn(whole);
  await screen.findByText("This address has an account. Sign in instead.");
  expect(screen.queryByText("Not possible.")).toBeNull();
});

it("hands on the session of a new account", async () => {
  const session = {
    user: { id: "o", name: "Oswin Tarrabel", email: "o.tarrabel@lomme.example" },
    demo: null,
  };
  const asked = answerWith({ "POST /accounts": { status: 201, body: session } });
  const onSignedIn = vi.fn();
  renderPage(<CreateAccountPage onSignedIn={onSignedIn} />);
  fillIn(whole);
  await waitFor(() => expect(onSignedIn).toHaveBeenCalled());
  expect(asked[0]?.body).toMatchObject({ email: "o.tarrabel@lomme.example" });
});
