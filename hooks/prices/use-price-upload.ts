import { queryOptions, useQuery, type QueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/client/api-client';
import { useEndpointMutation } from '@/hooks/client/use-endpoint-mutation';
import { afterBarsChanged } from '@/hooks/underlyings/use-underlyings';
import { type PriceUpload } from '@/shared/prices/price-upload';
import { priceUploadEndpoints } from '@/shared/prices/price-upload-endpoints';

const priceUploadQuery = (uploadId: string) =>
  queryOptions({
    queryKey: ['price-uploads', uploadId],
    queryFn: ({ signal }) => call(priceUploadEndpoints.readPriceUpload, { params: { uploadId }, signal }),
    staleTime: Infinity, // only this person's own next step changes a preview
  });

const keepPreview = (client: QueryClient, upload: PriceUpload) =>
  void client.setQueryData(priceUploadQuery(upload.id).queryKey, upload);

export const usePriceUpload = (uploadId: string) => useQuery(priceUploadQuery(uploadId));
export const useUploadPrices = () => useEndpointMutation(priceUploadEndpoints.uploadPrices, keepPreview);
export const useRereadPriceUpload = () => useEndpointMutation(priceUploadEndpoints.rereadPriceUpload, keepPreview);
export const useCommitPriceUpload = () =>
  useEndpointMutation(priceUploadEndpoints.commitPriceUpload, async (client, upload) => {
    keepPreview(client, upload);
    await afterBarsChanged(client);
  });
