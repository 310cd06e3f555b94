import { useReader } from "@/lib/shop-context.ts";
import { ClientBenchScreen } from "../client-bench-screen.tsx";
import { StaffBenchScreen } from "../staff-bench-screen.tsx";

/** The same address for both sides: the shop's jobs for its staff, their own signs for a client. */
export function BenchPage() {
  const { side } = useReader();
  return side === "client" ? <ClientBenchScreen /> : <StaffBenchScreen />;
}
