import { useParams } from "react-router-dom";
import { LinkPanel } from "@/features/sign-in/components/link-panel.tsx";

export function LinkPage() {
  const { token = "" } = useParams();
  return <LinkPanel key={token} token={token} />;
}
