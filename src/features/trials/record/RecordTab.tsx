import { Link } from "react-router-dom";
import type { TrialRow } from "../../../../shared/schemas/trial";
import { ErrorNote } from "../../../components/status";
import { Note, Remark } from "../../../components/text";
import { sectionOf, trialWords } from "../model/trialWords";
import { SolidsSection, SolutionsSection } from "./AssaySections";
import { ChargeSection } from "./ChargeSection";
import { useRecording } from "./context";
import { PlannedSection } from "./PlannedSection";
import { ProductsSection } from "./ProductsSection";
import { ReadingsSection } from "./ReadingsSection";
import { ReagentsSection } from "./ReagentsSection";
import { SamplesSection } from "./SamplesSection";
import { StandingPanel } from "./StandingPanel";
import { TrialSection } from "./TrialSection";

/** The record in the order it comes about at the bench, and beside it what it says so far. */
export function RecordTab({ trial, error }: { trial: TrialRow; error: unknown }) {
  const { problems, values } = useRecording();
  return (
    <div className="-mt-3 grid min-h-0 flex-1 lg:grid-cols-[minmax(0,1fr)_300px] lg:grid-rows-1">
      <div className="min-w-0 pt-3 pb-16 lg:overflow-y-auto lg:pr-6">
        {trial.deletedAt !== null && (
          <Remark className="mb-3">This trial was deleted. It counts nowhere until it is restored.</Remark>
        )}
        {trial.status === "approved" && (
          <Remark className="mb-3">
            Approved and locked{trial.statusReason !== "" && `: ${trial.statusReason}`}. A metallurgist can open it
            again, with a reason.
          </Remark>
        )}
        {values.status === "rejected" && (
          <Remark className="mb-3">
            Rejected: {values.statusReason || "no reason given"}. It counts in no figure.
          </Remark>
        )}
        {error !== null && <ErrorNote className="mb-3" doing="Not saved" error={error} />}
        {error === null && problems.length > 0 && (
          <Remark className="mb-3 border-signal!">
            <b>Not saved.</b> Nothing typed is lost; these need a hand first:
            <ul role="alert">
              {problems.map(({ path, message }) => (
                <li key={`${path} ${message}`}>
                  <Link to={{ hash: sectionOf(path) }}>{trialWords(path)}</Link>: {message}
                </li>
              ))}
            </ul>
          </Remark>
        )}
        {trial.invented && <Note className="pb-2">Invented data, for demonstration.</Note>}
        <TrialSection id={trial.id} />
        <PlannedSection />
        <ChargeSection />
        <ReadingsSection />
        <ReagentsSection />
        <SamplesSection />
        <SolutionsSection />
        <ProductsSection />
        <SolidsSection />
      </div>
      <aside
        aria-label="What the record says"
        className="border-rule pt-3 pb-8 max-lg:border-t lg:overflow-y-auto lg:border-l lg:pl-5"
      >
        <StandingPanel />
      </aside>
    </div>
  );
}
