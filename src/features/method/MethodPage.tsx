import { lazy, Suspense, useMemo } from "react";
import { useQuery } from "@tanstack/react-query";
import { Link, NavLink, useLocation, useParams } from "react-router-dom";
import { ErrorNote, Loading } from "../../components/status";
import { Empty } from "../../components/text";
import { type Anchor, anchorsOf } from "../../lib/anchors";
import { classes } from "../../lib/classes";
import { usePageTitle } from "../../lib/title";
import { documents } from "./documents";

const Prose = lazy(() => import("./Prose"));

const shelf = [
  { path: "method", label: "The method" },
  { path: "data", label: "The data" },
  { path: "accounts", label: "Metal accounts" },
  { path: "solver", label: "The solver, for scripts" },
  { path: "api", label: "The API" },
  { path: "changelog", label: "What changed" },
];
const addressOf = (path: string) => (path === "method" ? "/method" : `/method/${path}`);

/** How an answer comes about, and what it rests on: the product's own documents. */
export default function MethodPage() {
  usePageTitle("How this is worked out");
  const document = useParams()["*"] || "method";
  const load = documents.get(document);
  const {
    data: text,
    error,
    refetch,
  } = useQuery({
    queryKey: ["document", document],
    queryFn: () => load?.() ?? Promise.reject(new Error("There is no such document.")),
    staleTime: Infinity,
    enabled: load !== undefined,
  });
  const anchors = useMemo(() => anchorsOf(text ?? ""), [text]);
  return (
    <div className="px-5 py-4">
      <nav aria-label="Documents" className="flex flex-wrap gap-x-5 border-b border-ink">
        {shelf.map(({ path, label }) => (
          <NavLink
            key={path}
            end
            to={addressOf(path)}
            className={({ isActive }) =>
              classes(
                "-mb-px border-b-[3px] border-transparent py-1 text-sm whitespace-nowrap no-underline",
                isActive && "border-verdigris! font-bold",
              )
            }
          >
            {label}
          </NavLink>
        ))}
      </nav>
      {document.startsWith("decisions/") && (
        <p className="pt-3 text-sm text-muted">
          A decision record. <Link to="/method">Back to the method</Link>
        </p>
      )}
      {load === undefined ? (
        <Empty title="There is no such document" action={<Link to="/method">The method</Link>}>
          It may have been renamed since the link was made.
        </Empty>
      ) : error ? (
        <div className="py-4">
          <ErrorNote doing="The document could not be read" error={error} retry={() => void refetch()} />
        </div>
      ) : text === undefined ? (
        <Loading label="Opening" />
      ) : (
        <div className="gap-8 pt-3 lg:flex lg:items-start">
          <Contents anchors={anchors} />
          <div className="min-w-0 flex-1">
            <Suspense fallback={<Loading label="Opening" />}>
              <Prose document={document} text={text} anchors={anchors} />
            </Suspense>
          </div>
        </div>
      )}
    </div>
  );
}

/** Headings of the document; beside the text where there is room, folded above it on a tablet. */
function Contents({ anchors }: { anchors: readonly Anchor[] }) {
  const { hash } = useLocation();
  const heads = anchors.filter(({ level }) => level === 2 || level === 3);
  if (heads.length < 3) return null;
  const list = (
    <ol className="text-sm">
      {heads.map(({ id, text, level }) => (
        <li key={id} className={classes("my-0.5", level === 3 && "pl-4 text-muted")}>
          <Link to={{ hash: id }} className={classes("no-underline hover:underline", hash === `#${id}` && "font-bold")}>
            {text.replace(/`/g, "")}
          </Link>
        </li>
      ))}
    </ol>
  );
  return (
    <nav aria-label="Contents" className="no-print lg:sticky lg:top-4 lg:w-56 lg:shrink-0">
      <details className="lg:hidden">
        <summary className="w-fit font-mono text-sm font-bold">Contents</summary>
        {list}
      </details>
      <div className="hidden lg:block">
        <p className="mb-1 border-b border-ink pb-1 font-mono text-sm font-bold">Contents</p>
        {list}
      </div>
    </nav>
  );
}
