import { useQuery } from "@tanstack/react-query";
import { Suspense } from "react";
import { Outlet, useLocation } from "react-router-dom";
import { AccountMenu, AccountMenuLines } from "../features/account/AccountMenu";
import { groupsQuery } from "../features/group/groupQueries";
import { useAccount } from "../lib/session";
import { Opening } from "../ui/Opening";
import { PageFrame, type PagePlace } from "../ui/PageFrame";
import { useFocusOnNewPage } from "./useFocusOnNewPage";

/** The bar that stands over every page but the notebook's. */
export function HouseLayout() {
  const account = useAccount();
  const groups = useQuery(groupsQuery).data ?? [];
  const { pathname } = useLocation();
  useFocusOnNewPage(pathname);

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
      <Suspense fallback={<Opening what="the page" />}>
        <Outlet />
      </Suspense>
    </PageFrame>
  );
}
