import { useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { LinkForm } from "@/features/portfolio/components/link-form.tsx";
import { LinkList } from "@/features/portfolio/components/link-list.tsx";
import { MadeLink } from "@/features/portfolio/components/made-link.tsx";
import { PieceGrid } from "@/features/portfolio/components/piece-grid.tsx";
import { useShop } from "@/lib/shop-context.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";

export function PortfolioPage() {
  const { slug, unit, can } = useShop();
  const [chosen, setChosen] = useState<readonly string[] | null>(null);
  const [url, setUrl] = useState<string | null>(null);
  if (!can.seePortfolio) return <NotFoundScreen />;
  return (
    <Page
      title="Portfolio"
      under="Approved pieces to show to the next client, behind a link that ends by itself."
      actions={
        can.sharePortfolio &&
        chosen === null &&
        url === null && (
          <Button kind="primary" onClick={() => setChosen([])}>
            Make a link
          </Button>
        )
      }
    >
      {url !== null && <MadeLink url={url} onDone={() => setUrl(null)} />}
      {chosen !== null && (
        <LinkForm
          shop={slug}
          jobIds={chosen}
          onMade={(made) => {
            setUrl(made);
            setChosen(null);
          }}
          onGiveUp={() => setChosen(null)}
        />
      )}
      <div className="space-y-10">
        <section aria-label="Pieces">
          <PieceGrid shop={slug} unit={unit} chosen={chosen} onChoose={setChosen} />
        </section>
        <section aria-labelledby="links">
          <h2 id="links" className="mb-3 font-serif text-lg font-bold">
            Links
          </h2>
          <LinkList shop={slug} mayClose={can.sharePortfolio} />
        </section>
      </div>
    </Page>
  );
}
