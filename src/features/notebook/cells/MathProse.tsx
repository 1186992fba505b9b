import "katex/dist/katex.min.css";
import rehypeKatex from "rehype-katex";
import remarkMath from "remark-math";
import MarkdownProse, { type MarkdownProseProps } from "./MarkdownProse";

/** A formula that can't be set is shown as it was written, in the colour of a fault. */
const plugins: MarkdownProseProps["plugins"] = {
  remarkPlugins: [remarkMath],
  rehypePlugins: [
    [rehypeKatex, { throwOnError: false, strict: "ignore", errorColor: "var(--redline)", maxExpand: 500 }],
  ],
};

/** Markdown with TeX mathematics; fetched only when a cell has a dollar sign. */
export default function MathProse({ text, mentions }: Omit<MarkdownProseProps, "plugins">) {
  return <MarkdownProse text={text} plugins={plugins} mentions={mentions} />;
}
