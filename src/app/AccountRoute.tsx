import { useQuery } from "@tanstack/react-query";
import { AccountPage } from "../features/account/AccountPage";
import { groupsQuery } from "../features/group/groupQueries";

export default function AccountRoute() {
  const groups = useQuery(groupsQuery).data ?? [];
  return <AccountPage groups={groups} />;
}
