import { lazy, Suspense, useCallback } from "react";
import type { Point } from "../../../../shared/solution";
import { Loading } from "../../../components/status";
import { holdSetPoint } from "../model/adviceEdit";
import type { useLook } from "../model/useLook";
import type { Table } from "../model/useTable";
import { MapPanel, type MapPanelProps } from "./MapPanel";

const loadFilm = () => import("../film/Film");
const Film = lazy(async () => ({ default: (await loadFilm()).Film }));

type FromTable = "inputs" | "data" | "onSettle" | "onMoveSetPoint";
type FromLook = "onPlain" | "asText" | "onAsText" | "onFilm";

/** The middle: the map, or one setting varied over small maps. */
export function MapOrFilm({
  table,
  look,
  ...map
}: Omit<MapPanelProps, FromTable | FromLook> & { table: Table; look: ReturnType<typeof useLook> }) {
  const { inputs, data, fixed } = table;
  const { edit, settle } = table.draft;
  const moveSetPoint = useCallback((at: Point) => edit(holdSetPoint(at), "set point"), [edit]);
  const { solution } = map.model.asked;
  if (look.view.film)
    return (
      <Suspense fallback={<Loading label="Opening the filmstrip" />}>
        <Film
          wish={look.view.film}
          onWish={look.setFilm}
          {...{ inputs, data }}
          setPoint={solution.windows[map.model.view.window]?.setPoint ?? null}
          metals={map.model.metals}
          edit={fixed ? undefined : edit}
        />
      </Suspense>
    );
  return (
    <MapPanel
      {...map}
      {...{ inputs, data }}
      onPlain={look.map.setPlain}
      asText={look.view.asText}
      onAsText={(asText) => look.change({ asText })}
      onMoveSetPoint={fixed ? undefined : moveSetPoint}
      onSettle={settle}
      onFilm={() => void loadFilm().then(({ firstFilm }) => look.setFilm(firstFilm(inputs)))}
    />
  );
}
