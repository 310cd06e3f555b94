import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import * as contract from "#shared/contracts/wall-photos.ts";
import { allPages } from "@/lib/all-pages.ts";
import { addressOf, call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";
import { upload } from "@/lib/upload.ts";

export const wallPhotosQuery = (shop: string, jobId: string) =>
  queryOptions({
    queryKey: [...keys.job(shop, jobId), "wall photos"],
    queryFn: ({ signal }): Promise<contract.WallPhotoItem[]> =>
      allPages((cursor) =>
        call(contract.listWallPhotos, { params: { shop, jobId }, query: { limit: 100, cursor }, signal }),
      ),
  });

export const wallPhotoAddress = (shop: string, photoId: string): string =>
  addressOf(contract.getWallPhotoFile, { params: { shop, photoId } });

function useRefreshPhotos(shop: string, jobId: string) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: wallPhotosQuery(shop, jobId).queryKey });
}

export function useAddWallPhoto(shop: string, jobId: string) {
  return useMutation({
    mutationFn: (sent: { file: File; signal: AbortSignal; onProgress: (share: number) => void }) =>
      upload(contract.addWallPhoto, { params: { shop, jobId }, ...sent }),
    onSuccess: useRefreshPhotos(shop, jobId),
  });
}

export function useRemoveWallPhoto(shop: string, jobId: string) {
  return useMutation({
    mutationFn: (photoId: string) => call(contract.removeWallPhoto, { params: { shop, photoId } }),
    onSettled: useRefreshPhotos(shop, jobId),
  });
}
