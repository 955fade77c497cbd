import { createBrowserRouter, Navigate, type RouteObject } from "react-router-dom";
import { Gate } from "./Gate";
import { Waiting } from "./AppShell";
import { RouteError } from "./RouteError";

interface Screen {
  default: React.ComponentType;
}

/** A screen in a chunk of its own, with its own error boundary. */
const screen = (path: string, load: () => Promise<Screen>): RouteObject => ({
  path,
  lazy: async () => ({ Component: (await load()).default }),
  ErrorBoundary: RouteError,
  HydrateFallback: Waiting,
});

export const router = createBrowserRouter([
  // Before the gate: whoever follows the link has no account yet.
  screen("/invitation/:token", () => import("../features/invitation/InvitationPage")),
  {
    path: "/",
    Component: Gate,
    ErrorBoundary: RouteError,
    HydrateFallback: Waiting,
    children: [
      { index: true, element: <Navigate to="/plans" replace /> },
      screen("plans", () => import("../features/plans/PlansPage")),
      screen("plans/:planId", () => import("../features/workspace/WorkspacePage")),
      screen("plans/:planId/compare", () => import("../features/workspace/compare/ComparePage")),
      screen("chemistry", () => import("../features/chemistry/ChemistryPage")),
      screen("chemistry/:speciesId", () => import("../features/chemistry/ChemistryPage")),
      screen("reactions", () => import("../features/reactions/ReactionsPage")),
      screen("method/*", () => import("../features/method/MethodPage")),
      screen("feeds", () => import("../features/feeds/FeedsPage")),
      screen("feeds/:feedId", () => import("../features/feeds/FeedPage")),
      screen("campaigns", () => import("../features/campaigns/CampaignsPage")),
      screen("campaigns/compare", () => import("../features/campaigns/ComparePage")),
      screen("campaigns/:campaignId", () => import("../features/campaigns/CampaignPage")),
      screen("campaigns/:campaignId/edit", () => import("../features/campaigns/CampaignEditPage")),
      screen("bench", () => import("../features/trials/BenchPage")),
      screen("bench/:trialId", () => import("../features/trials/BenchTrialPage")),
      screen("trials/plan", () => import("../features/trials/PlanTrialPage")),
      screen("trials/:trialId", () => import("../features/trials/TrialPage")),
      screen("members", () => import("../features/members/MembersPage")),
      screen("mailbox", () => import("../features/mailbox/MailboxPage")),
      screen("*", () => import("./NotFoundPage")),
    ],
  },
]);
