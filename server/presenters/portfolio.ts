import type { z } from "zod";
import type { openShareLink, portfolioPieceSchema, shareLinkSchema } from "#shared/contracts/portfolio.ts";
import { faceStock } from "#shared/stack/backer.ts";
import { signBox } from "#shared/stack/sign-box.ts";
import type { ShareLink } from "../models/share-link.ts";
import type { Shop } from "../models/shop.ts";
import type { ApprovedPiece } from "../queries/portfolio.ts";
import { snapshotOf } from "../queries/snapshot-of.ts";

export function presentPortfolioPiece({ job, client, revision }: ApprovedPiece): z.input<typeof portfolioPieceSchema> {
  const { document, drawing } = snapshotOf(revision);
  const whole = signBox(document);
  return {
    jobId: job.id,
    title: job.title,
    client: client.name,
    letter: revision.letter,
    widthMm: whole.width,
    heightMm: whole.height,
    consent: job.consentAt !== null,
    elevation: drawing.picture,
  };
}

export function presentShareLink(now: Date, link: ShareLink): z.input<typeof shareLinkSchema> {
  return {
    id: link.id,
    label: link.label,
    pieces: (link.pieces ?? []).flatMap(({ jobId, job }) => (job ? [{ jobId, title: job.title }] : [])),
    state: link.revokedAt ? "revoked" : link.expiresAt <= now ? "expired" : "live",
    createdAt: link.createdAt.toISOString(),
    createdBy: link.maker?.name ?? "",
    expiresAt: link.expiresAt.toISOString(),
    openings: link.openings,
    lastOpenedAt: link.lastOpenedAt?.toISOString() ?? null,
  };
}

/** What a guest sees of each piece: the picture, what it is made of and its size; no person, note, price or file. */
export function presentSharedPieces(
  shop: Shop,
  pieces: readonly ApprovedPiece[],
): z.input<typeof openShareLink.result> {
  return {
    shopName: shop.name,
    unit: shop.unit,
    pieces: pieces.map(({ job, client, revision }) => {
      const { document, figures, drawing } = snapshotOf(revision);
      const { backer, layers } = document;
      const whole = signBox(document);
      return {
        title: job.title,
        client: client.name,
        widthMm: whole.width,
        heightMm: whole.height,
        offWallMm: figures.offWall.nominal,
        materials: [...new Set([faceStock(backer).name, ...layers.map(({ stock }) => `${stock.name} acrylic`)])],
        elevation: drawing.picture,
        section: drawing.section,
      };
    }),
  };
}
