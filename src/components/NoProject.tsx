import { useMay } from "../lib/session";
import { ButtonLink } from "./Button";
import { Empty } from "./text";

/** On every screen that belongs to a project, while there is none. */
export function NoProject() {
  const mayWrite = useMay("writePlans");
  return (
    <Empty
      title="No project yet"
      action={mayWrite && <ButtonLink to="/plans">To the plans: make one there</ButtonLink>}
    >
      Feeds, campaigns and trials belong to a project: a circuit of a site.
      {!mayWrite && " A metallurgist makes the first one."}
    </Empty>
  );
}
