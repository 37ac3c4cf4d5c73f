import { type HandlersOf } from '@/server/http/handler';
import { type OnBarsChanged } from '@/server/prices/bars-changed';
import { PriceUploadService } from '@/server/prices/price-upload-service';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';
import { type priceUploadEndpoints } from '@/shared/prices/price-upload-endpoints';

export interface PriceUploadDeps {
  readonly clock: Clock;
  readonly ids: Ids;
  readonly onBarsChanged: OnBarsChanged;
}

export function priceUploadHandlers(deps: PriceUploadDeps): HandlersOf<typeof priceUploadEndpoints> {
  const uploads = new PriceUploadService(deps);
  return {
    uploadPrices: ({ scope, params, file }) => uploads.upload(scope, { underlyingId: params.underlyingId, file }),
    readPriceUpload: ({ scope, params }) => uploads.show(scope, params.uploadId),
    rereadPriceUpload: ({ scope, params, body }) => uploads.reread(scope, params.uploadId, body),
    commitPriceUpload: ({ scope, params }) => uploads.commit(scope, params.uploadId),
  };
}
