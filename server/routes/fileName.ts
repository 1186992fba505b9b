/** Name of an exported notebook's file, from its title: "escape-of-hydrogen.md". */
export function fileName(title: string): string {
  const plain = title
    .normalize("NFKD")
    .replace(/\p{Mark}/gu, "")
    .toLowerCase()
    .replace(/['’]/g, "")
    .replace(/[^a-z0-9]+/g, "-")
    .replace(/^-+|-+$/g, "")
    .slice(0, 80);
  return `${plain || "notebook"}.md`;
}
