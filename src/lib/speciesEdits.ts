import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import type {
  ChemistryAnswer,
  EditedSpecies,
  speciesEditCreate,
  SpeciesEditRow,
} from "../../shared/schemas/speciesEdit";
import { api } from "./api";
import { allRows, queryString } from "./pages";
import { keys } from "./queries";

const byId = ({ edited }: ChemistryAnswer): ReadonlyMap<string, EditedSpecies> => new Map(edited.map((e) => [e.id, e]));

/** Which rows of the library in force are not as shipped, by species. */
export const useEditedSpecies = () =>
  useQuery({
    queryKey: keys.chemistry,
    queryFn: ({ signal }) => api.get<ChemistryAnswer>("/chemistry", { signal }),
    select: byId,
    structuralSharing: false,
    staleTime: Infinity,
    gcTime: Infinity,
  });

/** Every edit of one species, newest first, those taken back included. */
export const useSpeciesEdits = (species: string, enabled = true) =>
  useQuery({
    queryKey: keys.speciesEdits(species),
    queryFn: ({ signal }) => allRows<SpeciesEditRow>(`/chemistry/edits${queryString({ species })}`, signal),
    enabled,
    staleTime: 0,
  });

function useEditMutation<Variables>(mutationFn: (variables: Variables) => Promise<SpeciesEditRow>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    // After a refusal too: somebody else may have edited the same species.
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: keys.chemistry, exact: true }),
        client.invalidateQueries({ queryKey: [...keys.chemistry, "edits"] }),
        client.invalidateQueries({ queryKey: keys.plans }),
      ]),
  });
}

/** @param version  of the species, as `useEditedSpecies` tells it; 0 for one never edited */
export const useAddSpeciesEdit = () =>
  useEditMutation(({ version, ...body }: z.input<typeof speciesEditCreate> & { version: number }) =>
    api.post<SpeciesEditRow>("/chemistry/edits", body, { ifMatch: version }),
  );

export const useRevertSpeciesEdit = () =>
  useEditMutation(({ id, version, reason }: { id: string; version: number; reason: string }) =>
    api.delete<SpeciesEditRow>(`/chemistry/edits/${encodeURIComponent(id)}${queryString({ reason })}`, {
      ifMatch: version,
    }),
  );
