import type { ComponentType } from "react";
import { createBrowserRouter, Outlet, ScrollRestoration } from "react-router-dom";
import { ErrorScreen } from "./error-screen.tsx";
import { NotFoundScreen } from "./not-found-screen.tsx";
import { paths } from "./paths.ts";
import { PlainLayout } from "./plain-layout.tsx";
import { ShopLayout } from "./shop-layout.tsx";
import { useFocusOnMove } from "./use-focus-on-move.ts";

function Root() {
  useFocusOnMove();
  return (
    <>
      <ScrollRestoration />
      <Outlet />
    </>
  );
}

/** A page that is fetched when it is first opened. What is typed there is checked by schemas, in our words. */
const page =
  <Name extends string>(load: () => Promise<Record<Name, ComponentType>>, name: Name) =>
  async () => {
    await import("@/lib/zod-words.ts");
    return { Component: (await load())[name] };
  };

/** A page that checks nothing by schemas, so that it comes without them: what a client opens on a phone. */
const lightPage =
  <Name extends string>(load: () => Promise<Record<Name, ComponentType>>, name: Name) =>
  async () => ({ Component: (await load())[name] });

export const router = createBrowserRouter([
  {
    element: <Root />,
    errorElement: <ErrorScreen />,
    HydrateFallback: () => null,
    children: [
      { path: paths.share(":token"), lazy: page(() => import("./pages/share-page.tsx"), "SharePage") },
      {
        element: <PlainLayout />,
        children: [
          { path: paths.home(), lazy: page(() => import("./pages/home-page.tsx"), "HomePage") },
          { path: paths.signIn(), lazy: page(() => import("./pages/sign-in-page.tsx"), "SignInPage") },
          { path: paths.register(), lazy: page(() => import("./pages/register-page.tsx"), "RegisterPage") },
          {
            path: paths.forgotPassword(),
            lazy: page(() => import("./pages/forgot-password-page.tsx"), "ForgotPasswordPage"),
          },
          { path: paths.link(":token"), lazy: page(() => import("./pages/link-page.tsx"), "LinkPage") },
          {
            path: paths.unsubscribe(":token"),
            lazy: page(() => import("./pages/unsubscribe-page.tsx"), "UnsubscribePage"),
          },
          { path: paths.account(), lazy: page(() => import("./pages/account-page.tsx"), "AccountPage") },
          { path: "*", element: <NotFoundScreen /> },
        ],
      },
      {
        path: "/shop/:shop",
        element: <ShopLayout />,
        children: [
          // Pages of a shop; a broken one leaves the header standing.
          {
            errorElement: <ErrorScreen />,
            children: [
              { path: paths.bench(":shop"), lazy: page(() => import("./pages/bench-page.tsx"), "BenchPage") },
              { path: paths.job(":shop", ":jobId"), lazy: page(() => import("./pages/job-page.tsx"), "JobPage") },
              {
                path: paths.mockup(":shop", ":jobId"),
                lazy: page(() => import("./pages/mockup-page.tsx"), "MockupPage"),
              },
              {
                path: paths.cutPlan(":shop", ":jobId"),
                lazy: page(() => import("./pages/cut-plan-page.tsx"), "CutPlanPage"),
              },
              {
                path: paths.sheet(":shop", ":revisionId"),
                lazy: lightPage(() => import("./pages/sheet-page.tsx"), "SheetPage"),
              },
              { path: paths.clients(":shop"), lazy: page(() => import("./pages/clients-page.tsx"), "ClientsPage") },
              {
                path: paths.client(":shop", ":clientId"),
                lazy: page(() => import("./pages/client-page.tsx"), "ClientPage"),
              },
              {
                path: paths.portfolio(":shop"),
                lazy: page(() => import("./pages/portfolio-page.tsx"), "PortfolioPage"),
              },
              { path: paths.stock(":shop"), lazy: page(() => import("./pages/stock-page.tsx"), "StockPage") },
              { path: paths.prices(":shop"), lazy: page(() => import("./pages/prices-page.tsx"), "PricesPage") },
              { path: paths.team(":shop"), lazy: page(() => import("./pages/team-page.tsx"), "TeamPage") },
              { path: paths.shop(":shop"), lazy: page(() => import("./pages/shop-page.tsx"), "ShopPage") },
              { path: paths.limits(":shop"), lazy: page(() => import("./pages/limits-page.tsx"), "LimitsPage") },
              {
                path: paths.outgoingMail(":shop"),
                lazy: page(() => import("./pages/outgoing-mail-page.tsx"), "OutgoingMailPage"),
              },
              {
                path: paths.howWeWorkItOut(":shop"),
                lazy: page(() => import("./pages/how-we-work-it-out-page.tsx"), "HowWeWorkItOutPage"),
              },
              {
                path: "jobs/:jobId/compare",
                lazy: page(() => import("./pages/compare-page.tsx"), "ComparePage"),
              },
              { path: "*", element: <NotFoundScreen /> },
            ],
          },
        ],
      },
    ],
  },
]);
