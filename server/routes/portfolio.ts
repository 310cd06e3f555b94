import * as contract from "#shared/contracts/portfolio.ts";
import { makeShareLink } from "../commands/make-share-link.ts";
import { openShareLink } from "../commands/open-share-link.ts";
import { revokeShareLink } from "../commands/revoke-share-link.ts";
import { notFound } from "../http/app-error.ts";
import { type Routes, read, write } from "../http/route.ts";
import { portfolioPolicy } from "../policies/portfolio.ts";
import { presentPortfolioPiece, presentSharedPieces, presentShareLink } from "../presenters/portfolio.ts";
import { pageOf } from "../queries/page.ts";
import { findShareLink, listApprovedPieces, listShareLinks } from "../queries/portfolio.ts";

export function registerPortfolioRoutes(routes: Routes): void {
  read(routes, contract.listPortfolioPieces, async (context, { query }) => {
    if (!portfolioPolicy.see(context.actor)) throw notFound("portfolio");
    return pageOf(await listApprovedPieces(context, query), query.limit, presentPortfolioPiece, ({ job }) => [
      job.createdAt.toISOString(),
      job.id,
    ]);
  });

  read(routes, contract.listShareLinks, async (context, { query }) => {
    if (!portfolioPolicy.see(context.actor)) throw notFound("portfolio");
    return pageOf(
      await listShareLinks(context, query),
      query.limit,
      (link) => presentShareLink(context.now, link),
      ({ createdAt, id }) => [createdAt.toISOString(), id],
    );
  });

  write(routes, contract.makeShareLink, async (context, { body }) => {
    if (!portfolioPolicy.see(context.actor)) throw notFound("portfolio");
    const { linkId, token } = await makeShareLink(context, body);
    const link = await findShareLink(context, linkId);
    if (!link) throw notFound("link");
    return { link: presentShareLink(context.now, link), url: `${context.services.env.PUBLIC_URL}/share/${token}` };
  });

  write(routes, contract.revokeShareLink, async (context, { params }) => {
    await revokeShareLink(context, params.linkId);
    return undefined;
  });

  write(
    routes,
    contract.openShareLink,
    async (context, { params }) => {
      const { shop, pieces } = await openShareLink(context, params.token);
      return presentSharedPieces(shop, pieces);
    },
    { reach: "anyone" },
  );
}
