import Markdown, { type Components, type Options } from "react-markdown";
import { remarkMentions } from "./remarkMentions";

/** Headings of prose stand under the title of the notebook; pictures are not kept with a notebook, so their words stand. */
const parts: Components = {
  h1: ({ children }) => <h2>{children}</h2>,
  h2: ({ children }) => <h3>{children}</h3>,
  h3: ({ children }) => <h4>{children}</h4>,
  h4: ({ children }) => <h5>{children}</h5>,
  img: ({ alt }) => <span className="text-ink2">{alt}</span>,
  a: ({ href, children }) => (
    <a href={href} rel="noopener noreferrer nofollow" target={href?.startsWith("#") ? undefined : "_blank"}>
      {children}
    </a>
  ),
};

export interface MarkdownProseProps {
  text: string;
  plugins?: Pick<Options, "remarkPlugins" | "rehypePlugins">;
  /** Names that are set apart where they stand after an @. */
  mentions?: readonly string[];
}

/** Markdown as it reads. No HTML of the writer's goes through. */
export default function MarkdownProse({ text, plugins, mentions = [] }: MarkdownProseProps) {
  const remarkPlugins = [...(plugins?.remarkPlugins ?? []), remarkMentions(mentions)];
  return (
    <Markdown components={parts} {...plugins} remarkPlugins={remarkPlugins}>
      {text}
    </Markdown>
  );
}
