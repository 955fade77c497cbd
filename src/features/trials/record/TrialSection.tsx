import { Select } from "../../../components/Select";
import { TextArea, TextField } from "../../../components/TextField";
import { useAllTrials } from "../../../lib/trials";
import { useFeeds } from "../../../lib/feeds";
import { localInput, fromLocalInput } from "../../../lib/localTime";
import type { TrialValues } from "../model/trialValues";
import { problemAt, useRecording } from "./context";
import { Section } from "./Section";

const kinds = [
  { value: "leach", label: "leach" },
  { value: "cementation", label: "cementation" },
] as const;

/** Which trial this is. */
export function TrialSection({ id }: { id: string }) {
  const { values, edit, problems, readOnly, campaign, feed } = useRecording();
  const feeds = useFeeds(campaign.projectId).data ?? (feed ? [feed] : []);
  const others = useAllTrials({ campaignId: campaign.id, sort: "code", order: "asc" }).data ?? [];
  const set = <K extends keyof TrialValues>(key: K, value: TrialValues[K]) =>
    edit((t) => ({ ...t, [key]: value }), key);
  const text = (key: "code" | "operator", label: string, max: number) => (
    <TextField
      label={label}
      value={values[key]}
      maxLength={max}
      readOnly={readOnly}
      error={problemAt(problems, key)}
      onChange={(event) => set(key, event.target.value)}
    />
  );
  const instant = (key: "startedAt" | "endedAt", label: string) => (
    <TextField
      label={label}
      type="datetime-local"
      value={localInput(values[key])}
      readOnly={readOnly}
      error={problemAt(problems, key)}
      onChange={(event) => set(key, fromLocalInput(event.target.value))}
    />
  );
  const feedOptions = [...feeds, ...(feed && feeds.every((f) => f.id !== feed.id) ? [feed] : [])];
  return (
    <Section id="trial" title="Trial">
      <div className="grid gap-x-6 gap-y-3 sm:grid-cols-2 md:grid-cols-3">
        {text("code", "Code", 24)}
        <Select
          label="Stage"
          layout="stacked"
          value={values.stage}
          onChange={(stage) => set("stage", stage)}
          options={campaign.stages.map(({ code, name }) => ({ value: code, label: `${code}, ${name}` }))}
          error={problemAt(problems, "stage") ?? null}
          readOnly={readOnly}
        />
        <Select
          label="Kind"
          layout="stacked"
          value={values.kind}
          onChange={(kind) => set("kind", kind)}
          options={kinds}
          readOnly={readOnly}
        />
        <Select
          label="Feed"
          layout="stacked"
          value={values.feedId}
          onChange={(feedId) => set("feedId", feedId)}
          options={feedOptions.map((f) => ({ value: f.id, label: f.name }))}
          error={problemAt(problems, "feedId") ?? null}
          readOnly={readOnly}
        />
        {text("operator", "Operator", 120)}
        <Select
          label="Repeats"
          layout="stacked"
          value={values.replicateOf ?? "none"}
          onChange={(other) => set("replicateOf", other === "none" ? null : other)}
          options={[
            { value: "none", label: "no other trial" },
            ...others.filter((t) => t.id !== id).map((t) => ({ value: t.id, label: t.code })),
          ]}
          error={problemAt(problems, "replicateOf") ?? null}
          readOnly={readOnly}
        />
        {instant("startedAt", "Started")}
        {instant("endedAt", "Ended")}
      </div>
      {(!readOnly || values.notes !== "") && (
        <TextArea
          className="mt-3"
          label="Notes"
          rows={2}
          maxLength={4000}
          readOnly={readOnly}
          value={values.notes}
          onChange={(event) => set("notes", event.target.value)}
        />
      )}
    </Section>
  );
}
