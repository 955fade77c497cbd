import { lazy, Suspense, useState } from "react";
import { Tabs } from "../../components/choice";
import { Loading } from "../../components/status";
import { usePageTitle } from "../../lib/title";
import data from "../../../docs/data.md?raw";
import method from "../../../docs/method.md?raw";

const Prose = lazy(() => import("./Prose"));
type Part = "method" | "data";

/** How an answer comes about, and what it rests on: the product's own documents. */
export default function MethodPage() {
  usePageTitle("How this is worked out");
  const [part, setPart] = useState<Part>("method");
  const text = (source: string) => (
    <Suspense fallback={<Loading label="Opening" />}>
      <Prose text={source} />
    </Suspense>
  );
  return (
    <div className="px-5 py-4">
      <Tabs
        label="Documents"
        value={part}
        onChange={setPart}
        panels={[
          { value: "method", label: "The method", content: text(method) },
          { value: "data", label: "The data", content: text(data) },
        ]}
      />
    </div>
  );
}
