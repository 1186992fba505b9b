import type { NotebookDocument } from "../../../../shared/notebook/document";

/** Gives the notebook to the person as one Markdown file, as it is on the page, whether it could be saved or not. */
export async function downloadNotebook(notebook: NotebookDocument): Promise<void> {
  const { writeNotebookFile } = await import("../../../../shared/notebook/notebookFile");
  const address = URL.createObjectURL(
    new Blob([writeNotebookFile(notebook)], { type: "text/markdown;charset=utf-8" }),
  );
  const link = document.createElement("a");
  link.href = address;
  link.download = `${fileName(notebook.title)}.md`;
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}

function fileName(title: string): string {
  const plain = title.replace(/[^\p{Letter}\p{Number}]+/gu, "-").replace(/^-+|-+$/g, "");
  return plain.slice(0, 80).toLowerCase() || "notebook";
}
