import { describe, expect, it } from "vitest";
import { groupInvitation } from "../../../server/mail/templates/groupInvitation";
import { notebookInvitation } from "../../../server/mail/templates/notebookInvitation";
import { notebookShared } from "../../../server/mail/templates/notebookShared";

const hostile = `<img src=x onerror="alert(1)">\r\nBcc: all@carrow.example`;
const href = "https://tenuity.example/invitation#token";

const letters = [
  groupInvitation(
    { address: "a@b.example", userId: null },
    { group: hostile, role: "guest", invitedBy: hostile, href },
  ),
  notebookInvitation("a@b.example", { title: hostile, role: "reader", invitedBy: hostile, href }),
  notebookShared(
    { address: "a@b.example", userId: "someone" },
    { title: hostile, role: "reader", sharedBy: hostile, href },
  ),
];

describe("letters", () => {
  it.each(letters)("$kind: $subject", ({ subject, plain, html }) => {
    expect(subject).not.toMatch(/[\r\n]/);
    expect(html).not.toContain("<img");
    expect(html).toContain("&lt;img src=x onerror=&quot;alert(1)&quot;&gt;");
    expect(html).toContain(`href="${href}"`);
    expect(plain).toContain(href);
  });
});
