import { useParams } from "react-router-dom";
import { GroupPage } from "../features/group/GroupPage";

export default function GroupRoute() {
  const { groupId = "" } = useParams();
  return <GroupPage key={groupId} groupId={groupId} />;
}
