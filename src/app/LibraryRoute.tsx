import "../features/references/references.css";
export { LibraryPage as default } from "../features/references/LibraryPage";
