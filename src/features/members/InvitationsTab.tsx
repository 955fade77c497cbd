import type { InvitationRow } from "../../../shared/schemas/invitation";
import { Button } from "../../components/Button";
import { PlainTable } from "../../components/PlainTable";
import { ErrorNote, Loading } from "../../components/status";
import { Empty } from "../../components/text";
import { classes } from "../../lib/classes";
import { fullTime, savedAt } from "../../lib/format";
import { useInvitations, useInviteAgain, useWithdrawInvitation } from "./members";
import { invitationState, letterWords } from "./memberWords";

/** Every invitation, newest first, and what became of its letter. */
export function InvitationsTab({ onInvite }: { onInvite: () => void }) {
  const invitations = useInvitations();
  const again = useInviteAgain();
  const withdraw = useWithdrawInvitation();
  const busy = again.isPending || withdraw.isPending;
  if (invitations.error)
    return (
      <ErrorNote
        doing="The invitations could not be read"
        error={invitations.error}
        retry={() => void invitations.refetch()}
      />
    );
  if (!invitations.data) return <Loading label="Reading the invitations" />;
  if (invitations.data.length === 0)
    return (
      <Empty
        title="Nobody invited yet"
        action={
          <Button kind="primary" onClick={onInvite}>
            Invite a member
          </Button>
        }
      >
        An invitation is a letter with a link that opens one account, once.
      </Empty>
    );
  const failed = again.error ?? withdraw.error;
  return (
    <div className="min-h-0 flex-1 overflow-y-auto pb-6">
      {failed && <ErrorNote className="mb-2" doing="Not done" error={failed} />}
      <PlainTable
        caption="Invitations"
        rows={invitations.data}
        rowKey={({ id }) => id}
        columns={[
          { header: "e-mail", cell: ({ email }) => <b>{email}</b> },
          { header: "role", width: "9em", cell: ({ role }) => role },
          {
            header: "state",
            width: "14em",
            cell: (row) => (
              <>
                <span className={classes(row.state === "open" && "font-bold text-verdigris")}>
                  {invitationState[row.state]}
                </span>
                {row.state === "open" && (
                  <span className="text-muted" title={fullTime(row.expiresAt)}>
                    {" "}
                    until {savedAt(row.expiresAt)}
                  </span>
                )}
              </>
            ),
          },
          {
            header: "letter",
            cell: (row) => (
              <span className={row.mail?.state === "failed" ? "text-signal" : "text-muted"}>{letterWords(row)}</span>
            ),
          },
          {
            header: "by",
            width: "13em",
            cell: (row) => (
              <span className="text-muted">
                {row.invitedBy}, <time title={fullTime(row.createdAt)}>{savedAt(row.createdAt)}</time>
              </span>
            ),
          },
          {
            header: "",
            width: "13em",
            cell: (row) => <Actions row={row} busy={busy} onAgain={again.mutate} onWithdraw={withdraw.mutate} />,
          },
        ]}
      />
    </div>
  );
}

function Actions({
  row,
  busy,
  onAgain,
  onWithdraw,
}: {
  row: InvitationRow;
  busy: boolean;
  onAgain: (id: string) => void;
  onWithdraw: (id: string) => void;
}) {
  if (row.state === "accepted") return null;
  return (
    <span className="flex justify-end gap-3">
      <Button
        kind="quiet"
        className="h-auto!"
        disabled={busy}
        title="A new letter with a new link; the old link opens nothing any more"
        onClick={() => onAgain(row.id)}
      >
        Send again
      </Button>
      {row.state === "open" && (
        <Button kind="quiet" className="h-auto!" disabled={busy} onClick={() => onWithdraw(row.id)}>
          Withdraw
        </Button>
      )}
    </span>
  );
}
