import { useState } from "react";
import type { MemberRow } from "../../../shared/schemas/invitation";
import { DataTable } from "../../components/DataTable";
import { SearchField } from "../../components/SearchField";
import { ErrorNote, Loading } from "../../components/status";
import type { Column } from "../../components/tableModel";
import { fullTime, savedAt } from "../../lib/format";
import { useMembers } from "./members";
import { MemberDetail } from "./MemberDetail";

const columns: readonly Column<MemberRow>[] = [
  {
    id: "name",
    header: "name",
    value: (m) => m.name,
    cell: (m) => <span className="font-bold">{m.name}</span>,
  },
  { id: "email", header: "e-mail", width: "38%", wide: true, value: (m) => m.email },
  { id: "role", header: "role", width: "9em", value: (m) => m.role },
  { id: "state", header: "account", width: "6em", value: (m) => (m.disabled ? "closed" : "open") },
  {
    id: "since",
    header: "since",
    width: "9em",
    align: "right",
    filtered: false,
    wide: true,
    value: (m) => m.createdAt,
    cell: (m) => <time title={fullTime(m.createdAt)}>{savedAt(m.createdAt)}</time>,
  },
];

export function MembersTab() {
  const members = useMembers();
  const [filter, setFilter] = useState("");
  const [chosen, setChosen] = useState<string>();
  const selected = members.data?.find(({ id }) => id === chosen) ?? members.data?.[0];
  if (members.error)
    return (
      <ErrorNote doing="The members could not be read" error={members.error} retry={() => void members.refetch()} />
    );
  if (!members.data) return <Loading label="Reading the members" />;
  return (
    <div className="-mt-3 flex min-h-0 flex-1">
      <section aria-label="Members" className="flex min-w-0 flex-1 flex-col pt-3 pr-5">
        <div className="pb-2">
          <SearchField label="Filter members" placeholder="name, e-mail, role" value={filter} onChange={setFilter} />
        </div>
        <DataTable
          caption="Members of this server"
          rows={members.data}
          columns={columns}
          rowKey={({ id }) => id}
          filter={filter}
          initialSort={{ id: "name" }}
          selectedKey={selected?.id}
          onSelect={({ id }) => setChosen(id)}
          muted={({ disabled }) => disabled}
          className="min-h-0 flex-1 pb-4"
          empty={`No member matches “${filter}”.`}
        />
      </section>
      {selected && <MemberDetail key={selected.id} member={selected} />}
    </div>
  );
}
