import { CreateUser } from '@/server/database/migrations/0001-create-user';
import { CreateDesk } from '@/server/database/migrations/0002-create-desk';
import { CreateMembership } from '@/server/database/migrations/0003-create-membership';
import { CreateMentorship } from '@/server/database/migrations/0004-create-mentorship';
import { CreateInvitation } from '@/server/database/migrations/0005-create-invitation';
import { CreateSession } from '@/server/database/migrations/0006-create-session';
import { CreateLoginThrottle } from '@/server/database/migrations/0007-create-login-throttle';
import { CreateAuditEvent } from '@/server/database/migrations/0008-create-audit-event';
import { CreateUnderlying } from '@/server/database/migrations/0009-create-underlying';
import { CreateBar } from '@/server/database/migrations/0010-create-bar';
import { CreatePriceUpload } from '@/server/database/migrations/0011-create-price-upload';
import { CreateEntry } from '@/server/database/migrations/0012-create-entry';
import { CreateSealedForecast } from '@/server/database/migrations/0013-create-sealed-forecast';
import { CreateSealedContent } from '@/server/database/migrations/0014-create-sealed-content';
import { CreateFill } from '@/server/database/migrations/0015-create-fill';
import { CreateOutcome } from '@/server/database/migrations/0016-create-outcome';
import { CreateScoredOdds } from '@/server/database/migrations/0017-create-scored-odds';
import { KeepSealedForecastFromUpdate } from '@/server/database/migrations/0018-keep-sealed-forecast-from-update';
import { KeepSealedForecastFromDelete } from '@/server/database/migrations/0019-keep-sealed-forecast-from-delete';
import { KeepAuditEventFromUpdate } from '@/server/database/migrations/0020-keep-audit-event-from-update';
import { KeepAuditEventFromDelete } from '@/server/database/migrations/0021-keep-audit-event-from-delete';
import { KeepSealedContentFromUpdate } from '@/server/database/migrations/0022-keep-sealed-content-from-update';
import { TieSharesToTheirExercise } from '@/server/database/migrations/0023-tie-shares-to-their-exercise';
import { NotePricesBesideFills } from '@/server/database/migrations/0024-note-prices-beside-fills';
import { CreateScoredEntry } from '@/server/database/migrations/0025-create-scored-entry';
import { TellOddsWithoutAnswer } from '@/server/database/migrations/0026-tell-odds-without-answer';
import { CreateOutcomeChange } from '@/server/database/migrations/0030-create-outcome-change';
import { CreateWeeklyReview } from '@/server/database/migrations/0031-create-weekly-review';

/** In the order they are applied; a new one goes to the end. */
export const migrations = [
  CreateUser,
  CreateDesk,
  CreateMembership,
  CreateMentorship,
  CreateInvitation,
  CreateSession,
  CreateLoginThrottle,
  CreateAuditEvent,
  CreateUnderlying,
  CreateBar,
  CreatePriceUpload,
  CreateEntry,
  CreateSealedForecast,
  CreateSealedContent,
  CreateFill,
  CreateOutcome,
  CreateScoredOdds,
  KeepSealedForecastFromUpdate,
  KeepSealedForecastFromDelete,
  KeepAuditEventFromUpdate,
  KeepAuditEventFromDelete,
  KeepSealedContentFromUpdate,
  TieSharesToTheirExercise,
  NotePricesBesideFills,
  CreateScoredEntry,
  TellOddsWithoutAnswer,
  CreateOutcomeChange,
  CreateWeeklyReview,
];
