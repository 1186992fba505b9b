import { useParams } from "react-router-dom";
import { VettingPage } from "../features/vetting/VettingPage";
import "../features/vetting/vetting.css";

export default function VettingRoute() {
  const { vettingId = "" } = useParams();
  return <VettingPage key={vettingId} vettingId={vettingId} />;
}
