import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { InvitationEntity } from '@/server/account/invitation-entity';
import { LoginThrottleEntity } from '@/server/account/login-throttle-entity';
import { SessionEntity } from '@/server/account/session-entity';
import { AuditEventEntity } from '@/server/database/audit-event-entity';
import { boundedDriver } from '@/server/database/pool';
import { migrations } from '@/server/database/migrations/all-migrations';
import { DeskEntity } from '@/server/desk/desk-entity';
import { EntryEntity } from '@/server/entries/entry-entity';
import { FillEntity } from '@/server/fills/fill-entity';
import { OutcomeChangeEntity } from '@/server/outcomes/outcome-change-entity';
import { OutcomeEntity } from '@/server/outcomes/outcome-entity';
import { ScoredEntryEntity } from '@/server/outcomes/scored-entry-entity';
import { ScoredOddsEntity } from '@/server/outcomes/scored-odds-entity';
import { MembershipEntity } from '@/server/people/membership-entity';
import { MentorshipEntity } from '@/server/people/mentorship-entity';
import { PersonEntity } from '@/server/people/person-entity';
import { BarEntity } from '@/server/prices/bar-entity';
import { PriceUploadEntity } from '@/server/prices/price-upload-entity';
import { WeeklyReviewEntity } from '@/server/reviews/weekly-review-entity';
import { SealedContentEntity } from '@/server/seals/sealed-content-entity';
import { SealedForecastEntity } from '@/server/seals/sealed-forecast-entity';
import { UnderlyingEntity } from '@/server/underlyings/underlying-entity';

const POOL_SIZE = 10;

/** Times are UTC, dates are text, decimals are text; tables change by migrations only. */
export function createDataSource(url: string): DataSource {
  return new DataSource({
    type: 'mariadb',
    driver: boundedDriver,
    url,
    timezone: 'Z',
    dateStrings: ['DATE'],
    supportBigNumbers: true,
    bigNumberStrings: true,
    synchronize: false,
    migrationsRun: false,
    migrations,
    migrationsTableName: 'migration',
    poolSize: POOL_SIZE,
    entities: [
      PersonEntity,
      DeskEntity,
      MembershipEntity,
      MentorshipEntity,
      InvitationEntity,
      SessionEntity,
      LoginThrottleEntity,
      AuditEventEntity,
      UnderlyingEntity,
      BarEntity,
      PriceUploadEntity,
      EntryEntity,
      SealedForecastEntity,
      SealedContentEntity,
      FillEntity,
      OutcomeEntity,
      OutcomeChangeEntity,
      WeeklyReviewEntity,
      ScoredOddsEntity,
      ScoredEntryEntity,
    ],
  });
}
