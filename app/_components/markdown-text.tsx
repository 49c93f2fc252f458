import Markdown, { type Options } from "react-markdown";
import rehypeSanitize from "rehype-sanitize";
import remarkGfm from "remark-gfm";

import { isTooMuchMarkdown } from "./markdown-limits";

const OPTIONS: Options = {
  remarkPlugins: [remarkGfm],
  rehypePlugins: [rehypeSanitize],
  // A picture from elsewhere would tell a stranger who reads the sheet.
  disallowedElements: ["img"],
  unwrapDisallowed: true,
};

/** Text that people wrote, drawn on the server. What cannot be drawn safely is shown as it was typed. */
export function MarkdownText({ text }: { text: string }) {
  if (isTooMuchMarkdown(text)) return <p className="prose-sheet whitespace-pre-wrap">{text}</p>;

  return (
    <div className="prose-sheet">
      <Markdown {...OPTIONS}>{text}</Markdown>
    </div>
  );
}
