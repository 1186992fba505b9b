import { useQuery } from "@tanstack/react-query";
import { Suspense } from "react";
import { Link, Outlet } from "react-router-dom";
import { AccountMenu, AccountMenuLines } from "../features/account/AccountMenu";
import { groupsQuery } from "../features/group/groupQueries";
import { NoticesLine, NoticesWord } from "../features/notices/NoticesWord";
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
  const handbook: PagePlace = { to: "/handbook", label: "Handbook" };
  const places: PagePlace[] = account
    ? [
        { to: "/notebooks", label: "Notebooks" },
        onlyGroup ? { to: `/groups/${onlyGroup.id}`, label: "Group" } : { to: "/groups", label: "Groups" },
        handbook,
      ]
    : [handbook];

  return (
    <PageFrame
      places={places}
      person={
        account ? (
          <div className="flex min-w-0 items-baseline gap-26">
            <NoticesWord />
            <AccountMenu account={account} groups={groups} />
          </div>
        ) : (
          <Link to="/notebooks" className="type-meta no-underline hover:underline">
            Sign in
          </Link>
        )
      }
      personMenu={
        account ? (
          <>
            <NoticesLine />
            <AccountMenuLines account={account} />
          </>
        ) : (
          <MenuLink to="/notebooks">Sign in</MenuLink>
        )
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
