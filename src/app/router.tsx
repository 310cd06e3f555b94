import { createBrowserRouter, Outlet, ScrollRestoration } from "react-router-dom";
import { ErrorScreen } from "./error-screen.tsx";
import { NotFoundScreen } from "./not-found-screen.tsx";
import { PlainLayout } from "./plain-layout.tsx";
import { ShopLayout } from "./shop-layout.tsx";

function Root() {
  return (
    <>
      <ScrollRestoration />
      <Outlet />
    </>
  );
}

/** Each page is fetched when it is first opened. */
export const router = createBrowserRouter([
  {
    element: <Root />,
    errorElement: <ErrorScreen />,
    HydrateFallback: () => null,
    children: [
      {
        element: <PlainLayout />,
        children: [{ path: "*", element: <NotFoundScreen /> }],
      },
      {
        path: "/shop/:shop",
        element: <ShopLayout />,
        children: [
          // Pages of a shop; a broken one leaves the header standing.
          {
            errorElement: <ErrorScreen />,
            children: [{ path: "*", element: <NotFoundScreen /> }],
          },
        ],
      },
    ],
  },
]);
