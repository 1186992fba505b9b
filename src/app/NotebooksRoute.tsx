import { useQuery } from "@tanstack/react-query";
import { groupsQuery } from "../features/group/groupQueries";
import { NotebooksPage } from "../features/notebooks/NotebooksPage";

export default function NotebooksRoute() {
  const groups = useQuery(groupsQuery).data ?? [];
  return <NotebooksPage groups={groups} />;
}
