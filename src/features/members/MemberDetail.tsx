import { useState } from "react";
import type { MemberRow } from "../../../shared/schemas/invitation";
import type { MemberRole } from "../../../shared/schemas/member";
import { Button } from "../../components/Button";
import { Confirm } from "../../components/Dialog";
import { HistoryDialog } from "../../components/HistoryDialog";
import { Select } from "../../components/Select";
import { ErrorNote, Status } from "../../components/status";
import { Note, SectionHead } from "../../components/text";
import { TextArea, TextField } from "../../components/TextField";
import { useSession } from "../../lib/session";
import { useUpdateMember } from "./members";
import { roleOptions } from "./memberWords";

/** One member: name and role to change, the account to close. */
export function MemberDetail({ member }: { member: MemberRow }) {
  const { user } = useSession();
  const update = useUpdateMember();
  const [name, setName] = useState(member.name);
  const [role, setRole] = useState<MemberRole>(member.role);
  const [reason, setReason] = useState("");
  const [asking, setAsking] = useState(false);
  const [history, setHistory] = useState(false);
  const self = member.id === user.id;
  const changed = name.trim() !== member.name || role !== member.role;
  const send = (change: { name?: string; role?: MemberRole; disabled?: boolean }, then: () => void) =>
    update.mutate(
      { id: member.id, version: member.version, reason: reason.trim(), ...change },
      {
        onSuccess: () => {
          setReason("");
          then();
        },
      },
    );
  return (
    <aside
      aria-label={`Member ${member.name}`}
      className="w-[280px] shrink-0 overflow-y-auto border-l border-rule pt-3 pb-6 pl-5 lg:w-[340px]"
    >
      <h2 className="text-lg">{member.name}</h2>
      <p className="font-mono text-sm break-all">{member.email}</p>
      <Note>
        {member.disabled ? "The account is closed: no sign-in, all sessions ended." : ""}
        {self && "This is you."}
      </Note>
      <SectionHead className="mt-4">Name and role</SectionHead>
      <form
        className="space-y-3 pt-3"
        onSubmit={(event) => {
          event.preventDefault();
          send({ name: name.trim(), role }, () => undefined);
        }}
      >
        <TextField label="Name" value={name} maxLength={100} onChange={(event) => setName(event.target.value)} />
        <Select label="Role" layout="stacked" value={role} onChange={setRole} options={roleOptions} />
        {changed && (
          <TextArea
            label="Why, for the record"
            rows={2}
            maxLength={500}
            value={reason}
            onChange={(event) => setReason(event.target.value)}
          />
        )}
        {self && role !== member.role && member.role === "admin" && (
          <Note>You would no longer be an administrator, and could not undo that yourself.</Note>
        )}
        <div className="flex items-center gap-3">
          <Button type="submit" disabled={!changed || name.trim() === "" || update.isPending}>
            Save
          </Button>
          {!changed && update.isSuccess && <Status tone="good">saved</Status>}
        </div>
        {update.error && <ErrorNote doing="Not changed" error={update.error} />}
      </form>
      <SectionHead className="mt-6">Account</SectionHead>
      <div className="flex flex-wrap gap-3 pt-3">
        {member.disabled ? (
          <Button disabled={update.isPending} onClick={() => send({ disabled: false }, () => undefined)}>
            Open the account again
          </Button>
        ) : (
          <Button kind="danger" disabled={self || update.isPending} onClick={() => setAsking(true)}>
            Close the account
          </Button>
        )}
        <Button onClick={() => setHistory(true)}>History</Button>
      </div>
      {self && <Note className="mt-2">Another administrator closes your account.</Note>}
      <Confirm
        open={asking}
        onOpenChange={setAsking}
        title={`Close the account of ${member.name}`}
        description="Every session ends at once and the member cannot sign in. What they recorded stays, under their name. The account can be opened again."
        action="Close the account"
        danger
        busy={update.isPending}
        onConfirm={() => send({ disabled: true }, () => setAsking(false))}
      >
        <TextArea
          label="Why, for the record"
          rows={2}
          maxLength={500}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
        />
      </Confirm>
      <HistoryDialog
        open={history}
        onOpenChange={setHistory}
        title={`History of ${member.name}`}
        path={`/members/${encodeURIComponent(member.id)}`}
        words={memberField}
      />
    </aside>
  );
}

const memberField = (path: string): string => (path === "disabled" ? "account closed" : path);
