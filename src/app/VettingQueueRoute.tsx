export { VettingQueue as default } from "../features/vetting/VettingQueue";
