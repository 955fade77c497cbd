import { useEffect, useMemo } from "react";
import Markdown, { type Components, type ExtraProps } from "react-markdown";
import { Link, useLocation } from "react-router-dom";
import remarkGfm from "remark-gfm";
import type { Anchor } from "../../lib/anchors";
import { resolved } from "./documents";

const linked = "underline decoration-rule underline-offset-4 hover:decoration-ink";
/** what one has jumped to stands out a little */
const spot = "scroll-mt-4 [&[data-here]]:bg-tint";

/** How the parts of one document are drawn; links between documents stay inside the application.
 *  @param document  path below docs without its ending     @param anchors  of the document, so that ids and links agree */
function componentsFor(document: string, anchors: readonly Anchor[]): Components {
  const byLine = new Map(anchors.map(({ line, id }) => [line, { id }]));
  const idOf = ({ node }: ExtraProps) => byLine.get(node?.position?.start.line ?? 0) ?? {};
  return {
    h1: ({ children, node }) => (
      <h1 {...idOf({ node })} className={`mt-2 mb-3 text-xl ${spot}`}>
        {children}
      </h1>
    ),
    h2: ({ children, node }) => (
      <h2 {...idOf({ node })} className={`mt-8 mb-2 border-b border-ink pb-1 text-lg ${spot}`}>
        {children}
      </h2>
    ),
    h3: ({ children, node }) => (
      <h3 {...idOf({ node })} className={`mt-5 mb-1 font-bold ${spot}`}>
        {children}
      </h3>
    ),
    p: ({ children, node }) => (
      <p {...idOf({ node })} className={`measure my-2 leading-relaxed ${spot}`}>
        {children}
      </p>
    ),
    ul: ({ children }) => <ul className="measure my-2 list-disc pl-5">{children}</ul>,
    ol: ({ children }) => <ol className="measure my-2 list-decimal pl-5">{children}</ol>,
    li: ({ children }) => <li className="my-1">{children}</li>,
    a: ({ href = "", children }) => {
      const to = resolved(document, href);
      return to === null ? (
        <em>{children}</em>
      ) : (
        <Link to={to} className={linked}>
          {children}
        </Link>
      );
    },
    code: ({ children }) => <code className="font-mono text-sm">{children}</code>,
    pre: ({ children }) => (
      <pre
        // a wide block is scrolled by keys as well
        tabIndex={0}
        className="my-2 overflow-x-auto border-l-4 border-rule bg-sheet px-3 py-2 text-sm"
      >
        {children}
      </pre>
    ),
    table: ({ children }) => (
      <div tabIndex={0} className="my-3 overflow-x-auto">
        <table className="border-collapse text-sm">{children}</table>
      </div>
    ),
    th: ({ children }) => (
      <th className="border-b border-ink px-2 py-1 text-left font-mono text-xs first:pl-0">{children}</th>
    ),
    td: ({ children }) => <td className="border-b border-rule px-2 py-1 align-baseline first:pl-0">{children}</td>,
    img: ({ alt }) => <em>{alt}</em>,
  };
}

/** A document in Markdown; raw HTML in it is not let through. The part that the address names is scrolled to and marked. */
export default function Prose({
  document,
  text,
  anchors,
}: {
  document: string;
  text: string;
  anchors: readonly Anchor[];
}) {
  const { hash, key } = useLocation();
  const components = useMemo(() => componentsFor(document, anchors), [document, anchors]);
  useEffect(() => {
    const here = hash === "" ? null : window.document.getElementById(decodeURIComponent(hash.slice(1)));
    if (!here) return;
    here.scrollIntoView({ block: "start" });
    here.dataset.here = "";
    return () => void delete here.dataset.here;
  }, [hash, key, text]);
  return (
    <article>
      <Markdown remarkPlugins={[remarkGfm]} components={components}>
        {text}
      </Markdown>
    </article>
  );
}
