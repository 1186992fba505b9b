import { KeptMailPage } from "../features/development/KeptMailPage";
import { PageFrame } from "../ui/PageFrame";

export default function KeptMailRoute() {
  return (
    <PageFrame places={[{ to: "/notebooks", label: "Notebooks" }]}>
      <KeptMailPage />
    </PageFrame>
  );
}
