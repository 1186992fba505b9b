import { useQuery } from "@tanstack/react-query";
import { fireEvent, screen, waitFor } from "@testing-library/react";
import { useState } from "react";
import { Route, Routes } from "react-router-dom";
import { afterEach, describe, expect, it, vi } from "vitest";
import { z } from "zod";
import { SessionGate } from "../../../src/app/SessionGate";
import { api } from "../../../src/lib/api";
import { answerWith, problemAnswer } from "../answers";
import { renderPage } from "../renderPage";

const tamsin = { id: "t", name: "Tamsin Orevale", email: "t.orevale@carrow.example" };
const pello = { id: "p", name: "Pello Marrash", email: "p.marrash@carrow.example" };
const signedOut = problemAnswer(401, "signed_out", "Sign in to go on.");

/** A page on which one writes, and which saves. */
function Desk() {
  const [text, setText] = useState("");
  const [saved, setSaved] = useState("not saved");
  const names = useQuery({ queryKey: ["names"], queryFn: () => api.get("/names", z.string()), retry: false });
  const save = () =>
    api.put("/desk", { text }, z.string()).then(setSaved, (error: Error) => setSaved(error.message));
  return (
    <>
      <h1>Desk</h1>
      <p>{names.data}</p>
      <input aria-label="Text" value={text} onChange={(event) => setText(event.target.value)} />
      <button onClick={() => void save()}>Save</button>
      <output>{saved}</output>
    </>
  );
}

function renderDesk() {
  return renderPage(
    <Routes>
      <Route element={<SessionGate />}>
        <Route path="/desk" element={<Desk />} />
      </Route>
    </Routes>,
    { at: "/desk" },
  );
}

function signIn() {
  fireEvent.change(screen.getByLabelText("Password"), { target: { value: "a long password" } });
  fireEvent.submit(screen.getByRole("form", { name: "Sign in" }));
}

afterEach(() => vi.unstubAllGlobals());

describe("a page that is not open to strangers", () => {
  it("is shown to those who are signed in", async () => {
    answerWith({ "GET /session": { body: { user: tamsin, demo: null } }, "GET /names": { body: "Tessal" } });
    renderDesk();
    await screen.findByRole("heading", { name: "Desk" });
  });

  it("shows the sign-in in its place, and itself at the same address afterwards", async () => {
    answerWith({
      "GET /session": { body: { user: null, demo: null } },
      "POST /session": { status: 201, body: { user: tamsin, demo: null } },
      "GET /names": { body: "Tessal" },
    });
    renderDesk();
    await screen.findByRole("heading", { name: "Sign in" });
    expect(screen.queryByRole("heading", { name: "Desk" })).toBeNull();
    signIn();
    await screen.findByRole("heading", { name: "Desk" });
    expect(screen.getByTestId("address").textContent).toBe("/desk");
  });

  it("says so where there is no connection", async () => {
    answerWith({});
    renderDesk();
    await screen.findByRole("heading", { name: "No connection" });
  });
});

describe("a session that ends", () => {
  async function writeAndLoseSession(returning: typeof tamsin) {
    let user: typeof tamsin | null = tamsin;
    const asked = answerWith({
      "GET /session": { body: { user: tamsin, demo: null } },
      "GET /names": { body: "Tessal" },
      "PUT /desk": () => (user ? { body: `saved for ${user.name}` } : signedOut),
      "POST /session": () => {
        user = returning;
        return { status: 201, body: { user, demo: null } };
      },
    });
    renderDesk();
    fireEvent.change(await screen.findByLabelText("Text"), { target: { value: "T = 425 K" } });
    user = null;
    fireEvent.click(screen.getByRole("button", { name: "Save" }));
    await screen.findByText(/Your session has ended/);
    return asked;
  }

  it("keeps the page and what is written, and sends what waited once the same person is back", async () => {
    await writeAndLoseSession(tamsin);
    signIn();
    await screen.findByText("saved for Tamsin Orevale");
    expect(screen.getByLabelText<HTMLInputElement>("Text").value).toBe("T = 425 K");
    expect(screen.queryByText(/Your session has ended/)).toBeNull();
  });

  it("sends nothing of one person's in another's name, and shows the other a page of their own", async () => {
    const asked = await writeAndLoseSession(pello);
    signIn();
    await waitFor(() => expect(screen.getByLabelText<HTMLInputElement>("Text").value).toBe(""));
    expect(asked.filter(({ path }) => path === "/desk")).toHaveLength(1);
    expect(screen.queryByText(/saved for/)).toBeNull();
  });
});
