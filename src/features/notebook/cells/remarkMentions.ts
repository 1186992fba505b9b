import { splitMentions } from "../../../../shared/schemas/mentions";

/** As much of a node of the Markdown tree as is needed here. */
interface TreeNode {
  type: string;
  value?: string;
  children?: TreeNode[];
  data?: { hName: string; hProperties: { className: string } };
}

/** Sets mentions of these names apart. Only in running text: in code and formulas an @ means something else. */
export function remarkMentions(names: readonly string[]) {
  return () =>
    (tree: TreeNode): void => {
      markMentions(tree, names);
    };
}

function markMentions(node: TreeNode, names: readonly string[]): void {
  // A leaf must stay without the property: what sets the tree takes its mere presence for children.
  if (node.children === undefined) return;
  node.children = node.children.flatMap((child): TreeNode[] => {
    if (child.type === "text" && child.value !== undefined) return pieces(child.value, names);
    markMentions(child, names);
    return [child];
  });
}

const pieces = (text: string, names: readonly string[]): TreeNode[] =>
  splitMentions(text, names).map((piece) => {
    const plain: TreeNode = { type: "text", value: piece.text };
    if (piece.name === null) return plain;
    return {
      type: "emphasis",
      children: [plain],
      data: { hName: "span", hProperties: { className: "mention" } },
    };
  });
