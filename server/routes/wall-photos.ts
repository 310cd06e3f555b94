import * as contract from "#shared/contracts/wall-photos.ts";
import { addWallPhoto } from "../commands/add-wall-photo.ts";
import { removeWallPhoto } from "../commands/remove-wall-photo.ts";
import { notAllowed, notFound } from "../http/app-error.ts";
import { shopIdOf } from "../http/context.ts";
import { FileAnswer } from "../http/file-answer.ts";
import { type Routes, read, upload, write } from "../http/route.ts";
import { photoLimits, preparePhoto } from "../photos/prepare-photo.ts";
import { wallPhotoPolicy } from "../policies/wall-photo.ts";
import { presentWallPhoto } from "../presenters/wall-photo.ts";
import { findJob } from "../queries/find-job.ts";
import { findWallPhoto } from "../queries/find-wall-photo.ts";
import { listWallPhotos } from "../queries/list-wall-photos.ts";
import { pageOf } from "../queries/page.ts";

export function registerWallPhotoRoutes(routes: Routes): void {
  read(routes, contract.listWallPhotos, async (context, { params, query }) => {
    const { facts } = await findJob(context, params.jobId);
    if (!wallPhotoPolicy.see(context.actor, facts)) throw notFound("photo");
    return pageOf(
      await listWallPhotos(context, params.jobId, query),
      query.limit,
      (photo) => presentWallPhoto(context.actor, facts, photo),
      ({ addedAt, id }) => [addedAt.toISOString(), id],
    );
  });

  upload(routes, contract.addWallPhoto, {
    maxBytes: photoLimits.fileBytes,
    allow: async (context, params) => {
      const { facts } = await findJob(context, params.jobId);
      if (!wallPhotoPolicy.see(context.actor, facts)) throw notFound("job");
      if (!wallPhotoPolicy.change(context.actor, facts))
        throw notAllowed("Photos are brought in by owners and makers.");
    },
    prepare: (file, context) => preparePhoto(file, shopIdOf(context)),
    handle: async (context, { params, file }) => {
      const { id } = await addWallPhoto(context, { jobId: params.jobId, photo: file });
      const { facts } = await findJob(context, params.jobId);
      return presentWallPhoto(context.actor, facts, await findWallPhoto(context, id));
    },
  });

  read(routes, contract.getWallPhotoFile, async (context, { params }) => {
    const { file, name } = await findWallPhoto(context, params.photoId);
    if (!file) throw notFound("file");
    return new FileAnswer({
      stream: await context.services.storage.stream(file.storageKey),
      byteSize: file.byteSize,
      mediaType: file.mediaType,
      fileName: name,
      disposition: "inline",
      keepForSeconds: 3600,
    });
  });

  write(routes, contract.removeWallPhoto, async (context, { params }) => {
    await removeWallPhoto(context, params.photoId);
    return undefined;
  });
}
