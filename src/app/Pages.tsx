import { lazy, Suspense } from "react";
import { Navigate, Route, Routes } from "react-router-dom";
import { Opening } from "../ui/Opening";
import { HouseLayout } from "./HouseLayout";
import { NotFoundPage } from "./NotFoundPage";
import { OpenGate } from "./OpenGate";
import { SessionGate } from "./SessionGate";
import { useNewPage } from "./useNewPage";

const AccountRoute = lazy(() => import("./AccountRoute"));
const CreateAccountRoute = lazy(() => import("./CreateAccountRoute"));
const GroupRoute = lazy(() => import("./GroupRoute"));
const GroupsRoute = lazy(() => import("./GroupsRoute"));
const HandbookRoute = lazy(() => import("./HandbookRoute"));
const InvitationRoute = lazy(() => import("./InvitationRoute"));
const KeptMailRoute = lazy(() => import("./KeptMailRoute"));
const NotebookPage = lazy(() =>
  import("../features/notebook/NotebookPage").then((file) => ({ default: file.NotebookPage })),
);
const NoticesRoute = lazy(() => import("./NoticesRoute"));
const NotebooksRoute = lazy(() => import("./NotebooksRoute"));

/**
 * Which page stands at which address. Each is loaded when it is first gone to. A page that is not open to strangers
 * shows the sign-in in its place.
 */
export function Pages() {
  useNewPage();
  return (
    <Suspense fallback={<Opening what="the page" />}>
      <Routes>
        <Route path="/accounts/new" element={<CreateAccountRoute />} />
        <Route element={<OpenGate />}>
          <Route element={<HouseLayout />}>
            <Route path="/handbook" element={<HandbookRoute />} />
          </Route>
        </Route>
        <Route path="/invitation" element={<InvitationRoute />} />
        <Route path="/development/mail" element={<KeptMailRoute />} />
        <Route element={<SessionGate />}>
          <Route path="/invitation/open" element={<InvitationRoute />} />
          <Route path="/notebooks/:notebookId/*" element={<NotebookPage />} />
          <Route element={<HouseLayout />}>
            <Route index element={<Navigate to="/notebooks" replace />} />
            <Route path="/notebooks" element={<NotebooksRoute />} />
            <Route path="/groups" element={<GroupsRoute />} />
            <Route path="/groups/:groupId" element={<GroupRoute />} />
            <Route path="/notices" element={<NoticesRoute />} />
            <Route path="/account" element={<AccountRoute />} />
            <Route path="*" element={<NotFoundPage />} />
          </Route>
        </Route>
      </Routes>
    </Suspense>
  );
}
