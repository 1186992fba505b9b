import { expect, it } from "vitest";
import { documentLimits } from "../../../../shared/notebook/document";
import { readNotebookText } from "../../../../src/features/notebooks/readNotebookText";

it("takes the text of a file to the character, a byte-order mark and line ends included", async () => {
  const text = "\ufeff# Ilmara\r\n\r\nλ > 3\r\n";
  expect(await readNotebookText(new File([text], "ilmara.md"))).toEqual({ ok: true, text });
});

it("refuses what is not text in UTF-8, naming the file", async () => {
  const reading = await readNotebookText(new File([new Uint8Array([0xff, 0xfe, 0x00])], "figure.png"));
  expect(reading).toMatchObject({ ok: false, message: expect.stringContaining("figure.png") as string });
});

it("refuses a file that no notebook could be, before reading it", async () => {
  const file = new File([], "huge.md");
  Object.defineProperty(file, "size", { value: documentLimits.documentLength * 4 + 1 });
  expect(await readNotebookText(file)).toMatchObject({ ok: false });
});
