export { HandbookPage as default } from "../features/handbook/HandbookPage";
