export { NoticesPage as default } from "../features/notices/NoticesPage";
