import { useState } from "react";
import type { FeedRow } from "../../../shared/schemas/feed";
import type { ChemicalData } from "../../../shared/species/chemicalData";
import { Button } from "../../components/Button";
import { Segmented } from "../../components/choice";
import { Dialog } from "../../components/Dialog";
import { ErrorNote, Loading } from "../../components/status";
import { useChemistry } from "../../lib/chemistry";
import { useFeeds } from "../../lib/feeds";
import type { CreatePlanDialogProps } from "./CreatePlanDialog";
import { FromFeed } from "./FromFeed";
import { FromMetal } from "./FromMetal";

/** A new plan, from a feed's assays or from a metal and a lixiviant. */
export default function CreatePlan(props: CreatePlanDialogProps) {
  const chemistry = useChemistry();
  const feeds = useFeeds(props.projectId);
  const error = chemistry.error ?? feeds.error;
  if (!error && chemistry.data && feeds.data) return <Start {...props} data={chemistry.data} feeds={feeds.data} />;
  return (
    <Dialog open={props.open} onOpenChange={props.onOpenChange} title="New plan" width={620}>
      {error ? (
        <ErrorNote
          doing={chemistry.error ? "The chemistry library could not be read" : "The feeds could not be read"}
          error={error}
          retry={() => {
            void chemistry.refetch();
            void feeds.refetch();
          }}
        />
      ) : (
        <Loading label="Reading the chemistry library" />
      )}
    </Dialog>
  );
}

function Start(props: CreatePlanDialogProps & { data: ChemicalData; feeds: readonly FeedRow[] }) {
  const { open, onOpenChange, feeds, feedId } = props;
  const [from, setFrom] = useState<"feed" | "metal">(feeds.length > 0 ? "feed" : "metal");
  const [step, setStep] = useState<1 | 2>(1);
  const feed = from === "feed";
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={feed ? `New plan, step ${step} of 2` : "New plan"}
      width={feed && step === 2 ? 760 : 620}
      footer={
        <>
          <Button onClick={() => onOpenChange(false)}>Cancel</Button>
          {feed && step === 2 && <Button onClick={() => setStep(1)}>Back</Button>}
          <Button type="submit" form="new-plan" kind="primary">
            {feed && step === 1 ? "Next: its metals" : "Create and open"}
          </Button>
        </>
      }
    >
      {step === 1 && (
        <Segmented
          label="Start from"
          className="mb-4"
          value={from}
          onChange={setFrom}
          options={[
            {
              value: "feed",
              label: "From a feed’s assays",
              disabled: feeds.length === 0,
              ...(feeds.length === 0 ? { title: "This project has no feed yet: enter one under Feeds" } : {}),
            },
            { value: "metal", label: "From a metal and a lixiviant" },
          ]}
        />
      )}
      {feed ? <FromFeed {...props} wanted={feedId} step={step} onStep={setStep} /> : <FromMetal {...props} />}
    </Dialog>
  );
}
