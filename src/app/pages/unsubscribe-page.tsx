import { useParams } from "react-router-dom";
import { UnsubscribePanel } from "@/features/mail-choices/components/unsubscribe-panel.tsx";

export function UnsubscribePage() {
  const { token = "" } = useParams();
  return <UnsubscribePanel key={token} token={token} />;
}
