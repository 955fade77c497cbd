import { lazy, Suspense } from "react";
import { reagentById } from "../../../../shared/reach/reagents";
import type { Circuit } from "../../../../shared/schemas/circuit";
import { Formula } from "../../../components/Formula";
import { Term } from "../../../components/Help";
import { SectionHead } from "../../../components/text";
import { significant, withUnit } from "../../../lib/format";
import { useAsking } from "./context";
import { Fold } from "./Fold";

const AroundFields = lazy(() => import("./AroundFields"));

/** What the chemistry does not say and the cautions ask about: extraction organic, oxygen, reagents in use. */
export function AroundSection() {
  const { circuit = {} } = useAsking().inputs;
  return (
    <section aria-label="Around the leach" className="mt-5">
      <SectionHead aside={<Term word="circuit">for the cautions</Term>}>Around the leach</SectionHead>
      <Fold className="pt-1" title={<Said circuit={circuit} />}>
        <Suspense fallback={null}>
          <AroundFields />
        </Suspense>
      </Fold>
    </section>
  );
}

function Said({ circuit: { sxOrganic, oxygenKPa, reagents = [] } }: { circuit: Circuit }) {
  if (!sxOrganic && oxygenKPa === undefined && reagents.length === 0)
    return <span className="text-muted">No reagent in use, no organic, no oxygen named</span>;
  return (
    <>
      {reagents.map((id, i) => (
        <span key={id}>
          {i > 0 && ", "}
          <Formula formula={reagentById.get(id)?.name ?? id} />
        </span>
      ))}
      {[
        reagents.length > 0 ? " in use" : "",
        ...(sxOrganic ? ["extraction organic met"] : []),
        ...(oxygenKPa === undefined ? [] : [`oxygen at ${withUnit(significant(oxygenKPa), "kPa")}`]),
      ]
        .filter((said, i) => i > 0 || said !== "")
        .join("; ")}
    </>
  );
}
