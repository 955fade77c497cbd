import { Suspense } from "react";
import { BrowserRouter, matchPath, Navigate, Route, Routes, useLocation } from "react-router-dom";
import { Waiting } from "./AppShell";
import { Gate } from "./Gate";
import { ScreenBoundary } from "./ScreenBoundary";
import { lateScreen, type LateScreen } from "./screens";

const invitation = lateScreen(() => import("../features/invitation/InvitationPage"));
const chemistry = lateScreen(() => import("../features/chemistry/ChemistryPage"));

const screens: readonly (readonly [path: string, screen: LateScreen])[] = [
  ["/plans", lateScreen(() => import("../features/plans/PlansPage"))],
  ["/plans/:planId", lateScreen(() => import("../features/workspace/WorkspacePage"))],
  ["/plans/:planId/compare", lateScreen(() => import("../features/workspace/compare/ComparePage"))],
  ["/chemistry", chemistry],
  ["/chemistry/:speciesId", chemistry],
  ["/reactions", lateScreen(() => import("../features/reactions/ReactionsPage"))],
  ["/method/*", lateScreen(() => import("../features/method/MethodPage"))],
  ["/feeds", lateScreen(() => import("../features/feeds/FeedsPage"))],
  ["/feeds/:feedId", lateScreen(() => import("../features/feeds/FeedPage"))],
  ["/campaigns", lateScreen(() => import("../features/campaigns/CampaignsPage"))],
  ["/campaigns/compare", lateScreen(() => import("../features/campaigns/ComparePage"))],
  ["/campaigns/:campaignId", lateScreen(() => import("../features/campaigns/CampaignPage"))],
  ["/campaigns/:campaignId/edit", lateScreen(() => import("../features/campaigns/CampaignEditPage"))],
  ["/bench", lateScreen(() => import("../features/trials/BenchPage"))],
  ["/bench/:trialId", lateScreen(() => import("../features/trials/BenchTrialPage"))],
  ["/trials/plan", lateScreen(() => import("../features/trials/PlanTrialPage"))],
  ["/trials/:trialId", lateScreen(() => import("../features/trials/TrialPage"))],
  ["/members", lateScreen(() => import("../features/members/MembersPage"))],
  ["/mailbox", lateScreen(() => import("../features/mailbox/MailboxPage"))],
  ["*", lateScreen(() => import("./NotFoundPage"))],
];

/** Fetches the screen of an address while one is still asked who is there. Without an account it would come for nothing, but the
 *  sign-in keeps the address and leads on to it. */
export function fetchScreen(pathname: string): void {
  if (matchPath("/invitation/:token", pathname)) return invitation.ahead();
  screens.find(([path]) => matchPath(path, pathname))?.[1].ahead();
}

function Screen({ screen }: { screen: LateScreen }) {
  const { key } = useLocation();
  const { Part } = screen;
  return (
    <ScreenBoundary place={key} onError={screen.forget}>
      <Suspense fallback={<Waiting />}>
        <Part />
      </Suspense>
    </ScreenBoundary>
  );
}

/** The declarative router: its other half, loaders and actions, weighs more than the whole of what is used of it (docs/decisions/0020). */
export function Router() {
  return (
    <BrowserRouter>
      <Everything />
    </BrowserRouter>
  );
}

function Everything() {
  const { key } = useLocation();
  return (
    <ScreenBoundary place={key}>
      <Routes>
        {/* Before the gate: whoever follows the link has no account yet. */}
        <Route path="/invitation/:token" element={<Screen screen={invitation} />} />
        <Route path="/" element={<Gate />}>
          <Route index element={<Navigate to="/plans" replace />} />
          {screens.map(([path, screen]) => (
            <Route key={path} path={path} element={<Screen screen={screen} />} />
          ))}
        </Route>
      </Routes>
    </ScreenBoundary>
  );
}
