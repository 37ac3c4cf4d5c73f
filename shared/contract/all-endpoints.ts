import { accountEndpoints } from '@/shared/account/account-endpoints';
import { deskEndpoints } from '@/shared/desk/desk-endpoints';
import { engineEndpoints } from '@/shared/engine/engine-endpoints';
import { entryEndpoints } from '@/shared/entries/entry-endpoints';
import { exportEndpoints } from '@/shared/exports/export-endpoints';
import { priceUploadEndpoints } from '@/shared/prices/price-upload-endpoints';
import { weeklyReviewEndpoints } from '@/shared/reviews/weekly-review-endpoints';
import { scoreEndpoints } from '@/shared/scores/score-endpoints';
import { todayEndpoints } from '@/shared/today/today-endpoints';
import { underlyingEndpoints } from '@/shared/underlyings/underlying-endpoints';

/** Every endpoint there is: the server mounts these and refuses to start when one has no handler. */
export const allEndpoints = {
  ...accountEndpoints,
  ...deskEndpoints,
  ...underlyingEndpoints,
  ...priceUploadEndpoints,
  ...entryEndpoints,
  ...todayEndpoints,
  ...scoreEndpoints,
  ...weeklyReviewEndpoints,
  ...engineEndpoints,
  ...exportEndpoints,
};
