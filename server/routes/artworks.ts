import * as contract from "#shared/contracts/artworks.ts";
import { acceptedType, largestArtworkBytes } from "../artwork/accept-upload.ts";
import { addArtwork } from "../commands/add-artwork.ts";
import { removeArtwork } from "../commands/remove-artwork.ts";
import { setTrueSize } from "../commands/set-true-size.ts";
import { cancelTrace, traceArtwork } from "../commands/trace-artwork.ts";
import { notAllowed, notFound, wrongState } from "../http/app-error.ts";
import { type Routes, read, upload, write } from "../http/route.ts";
import { artworkPolicy } from "../policies/artwork.ts";
import { presentArtwork, presentPieces } from "../presenters/artwork.ts";
import { answerFile } from "../queries/answer-file.ts";
import { findArtwork } from "../queries/find-artwork.ts";
import { findJob } from "../queries/find-job.ts";
import { listArtworks } from "../queries/list-artworks.ts";
import { pageOf } from "../queries/page.ts";

export function registerArtworkRoutes(routes: Routes): void {
  read(routes, contract.listArtworks, async (context, { params, query }) => {
    const { facts } = await findJob(context, params.jobId);
    if (!artworkPolicy.see(context.actor, facts)) throw notFound("artwork");
    const artworks = await listArtworks(context, params.jobId, query);
    return pageOf(
      artworks,
      query.limit,
      (artwork) => presentArtwork(context.actor, facts, artwork),
      ({ addedAt, id }) => [addedAt.toISOString(), id],
    );
  });

  upload(routes, contract.addArtwork, {
    maxBytes: largestArtworkBytes,
    allow: async (context, params) => {
      const { facts } = await findJob(context, params.jobId);
      if (!artworkPolicy.see(context.actor, facts)) throw notFound("job");
      if (!artworkPolicy.change(context.actor, facts)) throw notAllowed("Artwork is brought in by owners and makers.");
    },
    handle: async (context, { params, file }) => {
      const mediaType = await acceptedType(file);
      const { id } = await addArtwork(context, { jobId: params.jobId, file, mediaType });
      const { facts } = await findJob(context, params.jobId);
      return presentArtwork(context.actor, facts, await findArtwork(context, id));
    },
  });

  read(routes, contract.getArtwork, async (context, { params }) => {
    const artwork = await findArtwork(context, params.artworkId);
    const { facts } = await findJob(context, artwork.jobId);
    return presentArtwork(context.actor, facts, artwork);
  });

  read(routes, contract.getArtworkPieces, async (context, { params }) => {
    const artwork = await findArtwork(context, params.artworkId, { withPieces: true });
    if (artwork.state !== "ready") throw wrongState("This artwork has not become pieces.");
    return presentPieces(artwork);
  });

  read(routes, contract.getArtworkFile, async (context, { params }) => {
    const artwork = await findArtwork(context, params.artworkId);
    if (!artwork.file) throw notFound("file");
    return answerFile(context, artwork.file, { fileName: artwork.name, disposition: "attachment" });
  });

  write(routes, contract.setTrueSize, async (context, { params, body }) => {
    const artwork = await setTrueSize(context, params.artworkId, body);
    const { facts } = await findJob(context, artwork.jobId);
    return presentArtwork(context.actor, facts, artwork);
  });

  write(routes, contract.traceArtwork, async (context, { params, body }) => {
    const artwork = await traceArtwork(context, params.artworkId, body);
    const { facts } = await findJob(context, artwork.jobId);
    return presentArtwork(context.actor, facts, artwork);
  });

  write(routes, contract.cancelTrace, async (context, { params }) => {
    const artwork = await cancelTrace(context, params.artworkId);
    const { facts } = await findJob(context, artwork.jobId);
    return presentArtwork(context.actor, facts, artwork);
  });

  write(routes, contract.removeArtwork, async (context, { params }) => {
    await removeArtwork(context, params.artworkId);
    return undefined;
  });
}
