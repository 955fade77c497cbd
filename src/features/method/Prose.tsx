import Markdown, { type Components } from "react-markdown";
import remarkGfm from "remark-gfm";

/** Links between the documents lead nowhere on the screen; what they say stays. */
const components: Components = {
  h1: ({ children }) => <h1 className="mt-2 mb-3 text-xl">{children}</h1>,
  h2: ({ children }) => <h2 className="mt-8 mb-2 border-b border-ink pb-1 text-lg">{children}</h2>,
  h3: ({ children }) => <h3 className="mt-5 mb-1 font-bold">{children}</h3>,
  p: ({ children }) => <p className="measure my-2 leading-relaxed">{children}</p>,
  ul: ({ children }) => <ul className="measure my-2 list-disc pl-5">{children}</ul>,
  ol: ({ children }) => <ol className="measure my-2 list-decimal pl-5">{children}</ol>,
  li: ({ children }) => <li className="my-1">{children}</li>,
  a: ({ href, children }) =>
    href?.startsWith("#") ? (
      <a href={href} className="underline decoration-rule underline-offset-4">
        {children}
      </a>
    ) : (
      <em>{children}</em>
    ),
  code: ({ children }) => <code className="font-mono text-sm">{children}</code>,
  pre: ({ children }) => (
    <pre className="my-2 overflow-x-auto border-l-4 border-rule bg-sheet px-3 py-2 text-sm">{children}</pre>
  ),
  table: ({ children }) => (
    <div className="my-3 overflow-x-auto">
      <table className="border-collapse text-sm">{children}</table>
    </div>
  ),
  th: ({ children }) => (
    <th className="border-b border-ink px-2 py-1 text-left font-mono text-xs first:pl-0">{children}</th>
  ),
  td: ({ children }) => <td className="border-b border-rule px-2 py-1 align-baseline first:pl-0">{children}</td>,
};

/** A document in Markdown; raw HTML in it is not let through. */
export default function Prose({ text }: { text: string }) {
  return (
    <article>
      <Markdown remarkPlugins={[remarkGfm]} components={components}>
        {text}
      </Markdown>
    </article>
  );
}
