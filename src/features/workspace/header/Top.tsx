import { lazy, Suspense, useState } from "react";
import type { Table } from "../model/useTable";
import { type HeaderProps, WorkspaceHeader } from "./WorkspaceHeader";

const loadBanners = () => import("../address/LinkBanners");
const ProposalBanner = lazy(async () => ({ default: (await loadBanners()).ProposalBanner }));
const IgnoredBanner = lazy(async () => ({ default: (await loadBanners()).IgnoredBanner }));
const FrozenBanner = lazy(async () => ({ default: (await import("./FrozenBanner")).FrozenBanner }));

/** The line over the sheet: whose settings stand there, and what may be done with the whole.
 *  @param ignored  what of the address could not be taken, in words */
export function Top({
  table,
  ignored,
  ...commands
}: Omit<HeaderProps, "plan" | "draft"> & { table: Table; ignored: readonly string[] }) {
  const { plan, frozen, draft, proposal } = table;
  const [unread, setUnread] = useState(ignored);
  return (
    <>
      {unread.length > 0 && (
        <Suspense fallback={null}>
          <IgnoredBanner ignored={unread} onClose={() => setUnread([])} />
        </Suspense>
      )}
      {frozen ? (
        <Suspense fallback={<div className="min-h-11 shrink-0 border-b border-ink" />}>
          <FrozenBanner
            {...frozen}
            plan={plan}
            onRestore={() => table.restore(frozen)}
            onCopyLink={commands.onCopyLink}
            said={commands.said}
            onUnsay={commands.onUnsay}
            onSheet={() => commands.onExport("sheet")}
            onComments={commands.onComments}
          />
        </Suspense>
      ) : proposal ? (
        <Suspense fallback={null}>
          <ProposalBanner
            plan={plan}
            mine={draft.inputs}
            unsaved={draft.changed}
            settings={proposal}
            onKeep={table.keepProposal}
            onLeave={table.leaveProposal}
          />
        </Suspense>
      ) : (
        <WorkspaceHeader plan={plan} draft={draft} {...commands} />
      )}
    </>
  );
}
