import { fireEvent, screen, within } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { Pages } from "../../../src/app/Pages";
import { answerWith } from "../answers";
import { renderPage } from "../renderPage";

const tamsin = { id: "t", name: "Tamsin Orevale", email: "t.orevale@carrow.example" };

beforeEach(() => {
  window.scrollTo = () => undefined;
});
afterEach(() => vi.unstubAllGlobals());

const places = () =>
  within(screen.getByRole("navigation", { name: "Main" }))
    .getAllByRole("link")
    .map((link) => link.textContent);

describe("a page that is open to everyone", () => {
  it("is shown to strangers, asks nothing that is not theirs, and leads to the sign-in", async () => {
    const asked = answerWith({ "GET /session": { body: { user: null, demo: null } } });
    renderPage(<Pages />, { at: "/handbook?show=corrections" });
    await screen.findByRole("heading", { name: "Handbook", level: 1 });
    expect(places()).toEqual(["Handbook"]);
    expect(asked.map(({ path }) => path)).toEqual(["/session"]);
    fireEvent.click(screen.getByRole("link", { name: "Sign in" }));
    await screen.findByRole("heading", { name: "Sign in" });
    fireEvent.click(screen.getByRole("link", { name: /^Handbook/ }));
    await screen.findByRole("heading", { name: "Handbook", level: 1 });
  });

  it("stands among the other places for who is signed in", async () => {
    answerWith({ "GET /session": { body: { user: tamsin, demo: null } }, "GET /groups": { body: [] } });
    renderPage(<Pages />, { at: "/handbook?show=corrections" });
    await screen.findByRole("heading", { name: "Handbook", level: 1 });
    expect(places()).toEqual(["Notebooks", "Groups", "Handbook"]);
    expect(screen.getByRole("button", { name: /Tamsin Orevale/ })).toBeTruthy();
  });

  it("is shown without a connection too, since it needs none", async () => {
    answerWith({});
    renderPage(<Pages />, { at: "/handbook?show=corrections" });
    await screen.findByRole("heading", { name: "Handbook", level: 1 });
  });
});
