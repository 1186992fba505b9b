import { useQuery } from "@tanstack/react-query";
import { Suspense } from "react";
import { Link, Outlet } from "react-router-dom";
import { AccountMenu, AccountMenuLines } from "../features/account/AccountMenu";
import { groupsQuery } from "../features/group/groupQueries";
import { useAccount } from "../lib/session";
import { MenuLink } from "../ui/Menu";
import { Opening } from "../ui/Opening";
import { PageFrame, type PagePlace } from "../ui/PageFrame";
import { PageErrorBoundary } from "./PageErrorBoundary";

/** The bar that stands over every page but the notebook's; strangers see the places that are open to them. */
export function HouseLayout() {
  const account = useAccount();
  const groups = useQuery({ ...groupsQuery, enabled: account !== null }).data ?? [];

  const onlyGroup = groups.length === 1 ? groups[0] : undefined;
  const references: PagePlace = { to: "/references", label: "References" };
  const handbook: PagePlace = { to: "/handbook", label: "Handbook" };
  const places: PagePlace[] = account
    ? [
        { to: "/notebooks", label: "Notebooks" },
        references,
        ...(groups.some(({ abilities }) => abilities.seeQueue) ? [{ to: "/vetting", label: "Vetting" }] : []),
        onlyGroup ? { to: `/groups/${onlyGroup.id}`, label: "Group" } : { to: "/groups", label: "Groups" },
        handbook,
      ]
    : [references, handbook];

  return (
    <PageFrame
      places={places}
      person={
        account ? (
          <AccountMenu account={account} groups={groups} />
        ) : (
          <Link to="/notebooks" className="type-meta no-underline hover:underline">
            Sign in
          </Link>
        )
      }
      personMenu={
        account ? <AccountMenuLines account={account} /> : <MenuLink to="/notebooks">Sign in</MenuLink>
      }
    >
      <PageErrorBoundary framed>
        <Suspense fallback={<Opening what="the page" />}>
          <Outlet />
        </Suspense>
      </PageErrorBoundary>
    </PageFrame>
  );
}
