import { documentLimits } from "../../../shared/notebook/document";
import { formatFixed } from "../../lib/format";

export type FileReading = { ok: true; text: string } | { ok: false; message: string };

/** The text of a chosen file, or why it is none. What the text says is for the server to judge. */
export async function readNotebookText(file: File): Promise<FileReading> {
  const longest = documentLimits.documentLength * 4;
  if (file.size > longest) {
    return {
      ok: false,
      message: `${file.name} is larger than a notebook may be: at most ${formatFixed(documentLimits.documentLength)} characters.`,
    };
  }
  try {
    const text = new TextDecoder("utf-8", { fatal: true, ignoreBOM: true }).decode(await file.arrayBuffer());
    return { ok: true, text };
  } catch {
    return {
      ok: false,
      message: `${file.name} is not text in UTF-8. Export the notebook again, or save the file as UTF-8.`,
    };
  }
}
