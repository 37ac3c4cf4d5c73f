import { type DataSource } from 'typeorm';
import { accountHandlers } from '@/server/account/account-handlers';
import { AccountService } from '@/server/account/account-service';
import { LoginThrottle } from '@/server/account/login-throttle';
import { MeService } from '@/server/account/me-service';
import { PasswordHasher } from '@/server/account/password-hasher';
import { SessionStore } from '@/server/account/session-store';
import { SignInFlow } from '@/server/account/sign-in-flow';
import { DeskScopes } from '@/server/database/desk-scope';
import { deskHandlers } from '@/server/desk/desk-handlers';
import { DeskService } from '@/server/desk/desk-service';
import { DeskStore } from '@/server/desk/desk-store';
import { EngineService } from '@/server/engine/engine-service';
import { EntryDescriber } from '@/server/entries/describe-entry';
import { entryHandlers } from '@/server/entries/entry-handlers';
import { EntryService } from '@/server/entries/entry-service';
import { ExportService } from '@/server/exports/export-service';
import { FillService } from '@/server/fills/fill-service';
import { OutcomeService } from '@/server/outcomes/outcome-service';
import { type HandlersOf } from '@/server/http/handler';
import { PeopleStore } from '@/server/people/people-store';
import { priceUploadHandlers } from '@/server/prices/price-upload-handlers';
import { weeklyReviewHandlers } from '@/server/reviews/weekly-review-handlers';
import { WeeklyReviewService } from '@/server/reviews/weekly-review-service';
import { type Clock } from '@/server/runtime/clock';
import { type Configuration } from '@/server/runtime/configuration';
import { type Ids } from '@/server/runtime/ids';
import { ScoreService } from '@/server/scores/score-service';
import { SealService } from '@/server/seals/seal-service';
import { TodayService } from '@/server/today/today-service';
import { underlyingHandlers } from '@/server/underlyings/underlying-handlers';
import { UnderlyingService } from '@/server/underlyings/underlying-service';
import { type allEndpoints } from '@/shared/contract/all-endpoints';

export interface Surroundings {
  readonly configuration: Configuration;
  readonly dataSource: DataSource;
  readonly clock: Clock;
  readonly ids: Ids;
}

/** Builds every service once and names the handler of every endpoint. */
export function createServices({ configuration, dataSource, clock, ids }: Surroundings) {
  const people = new PeopleStore(dataSource);
  const desks = new DeskStore(dataSource);
  const deskService = new DeskService(desks);
  const scopes = new DeskScopes(dataSource);
  const me = new MeService(scopes, people, deskService, clock);
  const hasher = new PasswordHasher({ pepper: configuration.PASSWORD_PEPPER, cost: configuration.BCRYPT_COST });
  const accounts = new AccountService({
    people,
    hasher,
    throttle: new LoginThrottle(dataSource, clock),
    clock,
    ids,
    isSignUpOpen: configuration.OPEN_SIGN_UP === 'yes',
  });
  const flow = new SignInFlow(accounts, people);

  const outcomes = new OutcomeService({ clock, ids });
  const onBarsChanged = outcomes.onBarsChanged.bind(outcomes);
  const underlyings = new UnderlyingService({ clock });

  const describer = new EntryDescriber();
  const entries = new EntryService({ clock, ids, describer });
  const seals = new SealService({ clock, ids, outcomes });
  const fills = new FillService({ clock, ids, outcomes });
  const scores = new ScoreService();
  const exports = new ExportService({ describer, clock });
  const engine = new EngineService();
  const today = new TodayService({ clock, entries, underlyings, scores });

  const handlers: HandlersOf<typeof allEndpoints> = {
    ...accountHandlers({ accounts, flow, me, people }),
    ...deskHandlers(deskService),
    ...underlyingHandlers({ clock, ids, onBarsChanged }),
    ...priceUploadHandlers({ clock, ids, onBarsChanged }),
    ...entryHandlers({ entries, seals, fills }),
    ...weeklyReviewHandlers(new WeeklyReviewService({ clock, describer })),
    readToday: ({ scope }) => today.read(scope),
    readScores: ({ scope, query }) => scores.read(scope, query),
    exportJournal: async ({ scope, query }) => exports.journal(scope, query),
    computeCases: ({ person, params, body }) =>
      engine.compute(person.id, { command: params.command, cases: body.cases }),
  };
  return {
    me,
    flow,
    people,
    hasher,
    entries,
    seals,
    fills,
    scopes,
    onBarsChanged,
    sessionStore: new SessionStore(dataSource, clock),
    handlers,
    close: async () => {
      await Promise.all([hasher.close(), engine.close()]);
    },
  };
}
