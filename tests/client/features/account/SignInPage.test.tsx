import { fireEvent, screen, waitFor } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { SignInPage } from "../../../../src/features/account/SignInPage";
import { answerWith, problemAnswer } from "../../answers";
import { renderPage } from "../../renderPage";

const tamsin = { id: "t", name: "Tamsin Orevale", email: "t.orevale@carrow.example" };
const demo = [
  { email: "j.aldaker@carrow.example", name: "Jorun Aldaker", part: "lead" },
  { email: tamsin.email, name: tamsin.name, part: "researcher" },
];

afterEach(() => vi.unstubAllGlobals());

function fillIn(email: string, password: string) {
  fireEvent.change(screen.getByLabelText("E-mail"), { target: { value: email } });
  fireEvent.change(screen.getByLabelText("Password"), { target: { value: password } });
  fireEvent.submit(screen.getByRole("form", { name: "Sign in" }));
}

describe("signing in", () => {
  it("sends the address without its surrounding spaces, and the password as it is", async () => {
    const session = { user: tamsin, demo: null };
    const asked = answerWith({ "POST /session": { status: 201, body: session } });
    const onSignedIn = vi.fn();
    renderPage(<SignInPage demo={null} onSignedIn={onSignedIn} />);
    fillIn(" t.orevale@carrow.example ", " a long password ");
    await waitFor(() => expect(onSignedIn).toHaveBeenCalled());
    expect(onSignedIn.mock.calls[0]?.[0]).toEqual(session);
    expect(asked[0]?.body).toEqual({ email: "t.orevale@carrow.example", password: " a long password " });
  });

  it("says what the server says of a wrong password, and keeps what was written", async () => {
    answerWith({ "POST /session": problemAnswer(401, "wrong_credentials", "The password is not right.") });
    renderPage(<SignInPage demo={null} onSignedIn={vi.fn()} />);
    fillIn("a@b.example", "wrong");
    expect((await screen.findByRole("alert")).textContent).toContain("The password is not right.");
    expect(screen.getByLabelText<HTMLInputElement>("E-mail").value).toBe("a@b.example");
    expect(screen.getByLabelText<HTMLInputElement>("Password").value).toBe("wrong");
  });

  it("says how long to wait after too many attempts", async () => {
    answerWith({ "POST /session": problemAnswer(429, "too_many_requests", "Try again in 14 minutes.") });
    renderPage(<SignInPage demo={null} onSignedIn={vi.fn()} />);
    fillIn("a@b.example", "wrong");
    expect((await screen.findByRole("alert")).textContent).toContain("14 minutes");
  });

  it("says so where there is no connection", async () => {
    answerWith({});
    renderPage(<SignInPage demo={null} onSignedIn={vi.fn()} />);
    fillIn("a@b.example", "x");
    expect((await screen.findByRole("alert")).textContent).toContain("No connection");
  });

  it("shows the password on demand", () => {
    renderPage(<SignInPage demo={null} onSignedIn={vi.fn()} />);
    const field = screen.getByLabelText<HTMLInputElement>("Password");
    expect(field.type).toBe("password");
    fireEvent.click(screen.getByRole("button", { name: "Show the password" }));
    expect(field.type).toBe("text");
  });
});

describe("the demonstration's people", () => {
  it("sign in with one press", async () => {
    const asked = answerWith({ "POST /session/demo": { status: 201, body: { user: tamsin, demo } } });
    const onSignedIn = vi.fn();
    renderPage(<SignInPage demo={demo} onSignedIn={onSignedIn} />);
    fireEvent.click(screen.getByRole("button", { name: "Tamsin Orevale" }));
    await waitFor(() => expect(onSignedIn).toHaveBeenCalled());
    expect(asked[0]?.body).toEqual({ email: tamsin.email });
  });

  it("are not spoken of where there are none", () => {
    renderPage(<SignInPage demo={null} onSignedIn={vi.fn()} />);
    expect(screen.queryByText("Or look round as")).toBeNull();
  });
});

it("greets the person whose session ended, with their address filled in", () => {
  renderPage(<SignInPage demo={null} ended={tamsin} onSignedIn={vi.fn()} />);
  expect(screen.getByRole("main").textContent).toContain("Your session has ended, Tamsin Orevale");
  expect(screen.getByLabelText<HTMLInputElement>("E-mail").value).toBe(tamsin.email);
  expect(document.activeElement).toBe(screen.getByLabelText("Password"));
});

it("carries the caution that stands on each page", () => {
  renderPage(<SignInPage demo={null} onSignedIn={vi.fn()} />);
  expect(screen.getByRole("contentinfo").textContent).toContain("not for decisions on satellite drag");
});
