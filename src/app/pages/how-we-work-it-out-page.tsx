import { calculations } from "#shared/calculations/definitions.ts";
import { LinkButton } from "@/components/ui/link-button.tsx";
import { CalculationSheet } from "@/features/calculations/components/calculation-sheet.tsx";
import { useWorkedExamples } from "@/features/calculations/engine/use-worked-examples.ts";
import { useReader, useShop } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";
import { paths } from "../paths.ts";

export function HowWeWorkItOutPage() {
  return useReader().side === "shop" ? <ReferenceSheet /> : <NotFoundScreen />;
}

function ReferenceSheet() {
  const { slug } = useShop();
  const { state, compute } = useWorkedExamples();
  return (
    <Page
      title="How we work it out"
      under="Every calculation behind section, schedule, dry fit and drawing: its rule, its source, and an example run by the same code."
      actions={<LinkButton to={paths.limits(slug)}>The shop’s limits</LinkButton>}
    >
      <CalculationSheet groups={calculations} state={state} onComputeAgain={compute} />
    </Page>
  );
}
