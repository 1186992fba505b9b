import { useQuery } from "@tanstack/react-query";
import { Suspense } from "react";
import { Outlet } from "react-router-dom";
import { AccountMenu, AccountMenuLines } from "../features/account/AccountMenu";
import { groupsQuery } from "../features/group/groupQueries";
import { useAccount } from "../lib/session";
import { Opening } from "../ui/Opening";
import { PageFrame, type PagePlace } from "../ui/PageFrame";
import { PageErrorBoundary } from "./PageErrorBoundary";

/** The bar that stands over every page but the notebook's. */
export function HouseLayout() {
  const account = useAccount();
  const groups = useQuery(groupsQuery).data ?? [];

  const onlyGroup = groups.length === 1 ? groups[0] : undefined;
  const places: PagePlace[] = [
    { to: "/notebooks", label: "Notebooks" },
    onlyGroup ? { to: `/groups/${onlyGroup.id}`, label: "Group" } : { to: "/groups", label: "Groups" },
  ];

  return (
    <PageFrame
      places={places}
      person={account && <AccountMenu account={account} groups={groups} />}
      personMenu={account && <AccountMenuLines account={account} />}
    >
      <PageErrorBoundary framed>
        <Suspense fallback={<Opening what="the page" />}>
          <Outlet />
        </Suspense>
      </PageErrorBoundary>
    </PageFrame>
  );
}
