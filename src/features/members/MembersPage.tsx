import { useState } from "react";
import { useSearchParams } from "react-router-dom";
import { Button, ButtonLink } from "../../components/Button";
import { PageHead } from "../../components/PageHead";
import { Tabs } from "../../components/choice";
import { Empty, Note } from "../../components/text";
import { counted } from "../../lib/format";
import { useMay } from "../../lib/session";
import { usePageTitle } from "../../lib/title";
import { InvitationsTab } from "./InvitationsTab";
import { InviteDialog } from "./InviteDialog";
import { useInvitations, useMembers } from "./members";
import { MembersTab } from "./MembersTab";

/** Who may do what here; administrators let others in and close accounts. */
export default function MembersPage() {
  usePageTitle("Members");
  if (!useMay("manageMembers"))
    return (
      <div className="px-5">
        <Empty title="For administrators">Members are invited and changed by an administrator of this server.</Empty>
      </div>
    );
  return <Members />;
}

function Members() {
  const members = useMembers();
  const invitations = useInvitations();
  const [search, setSearch] = useSearchParams();
  const [inviting, setInviting] = useState(false);
  const shown = search.get("show") === "invitations" ? "invitations" : "members";
  const open = invitations.data?.filter(({ state }) => state === "open").length ?? 0;
  return (
    <>
      <PageHead
        title="Members"
        about={
          <Note>
            {members.data && counted(members.data.filter(({ disabled }) => !disabled).length, "member")}
            {open > 0 && `, ${counted(open, "open invitation")}`}
          </Note>
        }
      >
        <ButtonLink to="/mailbox">Letters</ButtonLink>
        <Button kind="primary" onClick={() => setInviting(true)}>
          Invite a member
        </Button>
      </PageHead>
      <Tabs
        label="Members and invitations"
        className="flex min-h-0 flex-1 flex-col px-5 pt-2"
        value={shown}
        onChange={(next) => setSearch(next === "members" ? {} : { show: next }, { replace: true })}
        panels={[
          { value: "members", label: "Members", content: <MembersTab />, fill: true },
          {
            value: "invitations",
            label: open > 0 ? `Invitations (${open} open)` : "Invitations",
            content: <InvitationsTab onInvite={() => setInviting(true)} />,
            fill: true,
          },
        ]}
      />
      <InviteDialog open={inviting} onOpenChange={setInviting} />
    </>
  );
}
