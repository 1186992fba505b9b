export { GroupsPage as default } from "../features/group/GroupsPage";
