import { useParams } from "react-router-dom";
import { PublishedArticle } from "../features/notebook/PublishedArticle";
import { ReferencePage } from "../features/references/ReferencePage";

export default function ReferenceRoute() {
  const { pin = "" } = useParams();
  return (
    <ReferencePage
      key={pin}
      pin={pin}
      article={({ document, result }) => <PublishedArticle pin={pin} document={document} result={result} />}
    />
  );
}
