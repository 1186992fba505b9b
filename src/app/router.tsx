import { lazy, Suspense } from "react";
import { createBrowserRouter, Navigate, Outlet, ScrollRestoration } from "react-router-dom";
import { Opening } from "../ui/Opening";
import { HouseLayout } from "./HouseLayout";
import { NotFoundPage } from "./NotFoundPage";
import { RouteErrorPage } from "./RouteErrorPage";
import { SessionGate } from "./SessionGate";

const AccountRoute = lazy(() => import("./AccountRoute"));
const CreateAccountRoute = lazy(() => import("./CreateAccountRoute"));
const GroupRoute = lazy(() => import("./GroupRoute"));
const GroupsRoute = lazy(() => import("./GroupsRoute"));
const NotebookPage = lazy(() =>
  import("../features/notebook/NotebookPage").then(({ NotebookPage }) => ({ default: NotebookPage })),
);
const NotebooksRoute = lazy(() => import("./NotebooksRoute"));

function Root() {
  return (
    <Suspense fallback={<Opening what="the page" />}>
      <Outlet />
      <ScrollRestoration />
    </Suspense>
  );
}

/** Each page is loaded when it is first gone to. A page that is not open to strangers shows the sign-in in its place. */
export function createRouter() {
  return createBrowserRouter([
    {
      element: <Root />,
      errorElement: <RouteErrorPage />,
      children: [
        { path: "/accounts/new", element: <CreateAccountRoute /> },
        {
          element: <SessionGate />,
          children: [
            { path: "/notebooks/:notebookId", element: <NotebookPage /> },
            { path: "/notebooks/:notebookId/versions/:number", element: <NotebookPage /> },
            {
              element: <HouseLayout />,
              children: [
                { index: true, element: <Navigate to="/notebooks" replace /> },
                {
                  errorElement: <RouteErrorPage framed />,
                  children: [
                    { path: "/notebooks", element: <NotebooksRoute /> },
                    { path: "/groups", element: <GroupsRoute /> },
                    { path: "/groups/:groupId", element: <GroupRoute /> },
                    { path: "/account", element: <AccountRoute /> },
                    { path: "*", element: <NotFoundPage /> },
                  ],
                },
              ],
            },
          ],
        },
      ],
    },
  ]);
}
