import { useCallback, useState } from "react";

/** What stands half typed in the big fields: kept like everything else, but it is no part of the record until it is kept. */
export interface BenchForm {
  pH: string;
  pHTemperature: string;
  cooled: boolean;
  orp: string;
  electrode: string | null;
  /** null: as at the last reading; empty: as the pulp */
  electrodeTemperature: string | null;
  temperature: string;
  /** minutes since the start; empty: now */
  at: string;
  amount: string;
  volume: string;
  makeUp: string;
  note: string;
}

export const emptyForm: BenchForm = {
  pH: "",
  pHTemperature: "",
  cooled: false,
  orp: "",
  electrode: null,
  electrodeTemperature: null,
  temperature: "",
  at: "",
  amount: "",
  volume: "",
  makeUp: "",
  note: "",
};

const key = (trialId: string) => `gangueway.bench.${trialId}`;

function read(trialId: string): BenchForm {
  try {
    const found: unknown = JSON.parse(localStorage.getItem(key(trialId)) ?? "{}");
    return typeof found === "object" && found !== null ? { ...emptyForm, ...found } : emptyForm;
  } catch {
    return emptyForm;
  }
}

/** With what the last reading leaves in the vessel filled in. */
export type FilledForm = BenchForm & { electrodeTemperature: string };

/** The half-typed entry of one trial, kept through a reload. */
export function useBenchForm(trialId: string) {
  const [form, setForm] = useState(() => read(trialId));
  const change = useCallback(
    (part: Partial<BenchForm>) =>
      setForm((old) => {
        const next = { ...old, ...part };
        try {
          localStorage.setItem(key(trialId), JSON.stringify(next));
        } catch {
          // this visit only
        }
        return next;
      }),
    [trialId],
  );
  return { form, change };
}
