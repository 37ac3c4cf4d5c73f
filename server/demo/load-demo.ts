import { type DataSource } from 'typeorm';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';
import { logReturns } from '@/journal/returns/log-returns';
import {
  countSessions,
  type ExchangeSession,
  nextSession,
  sessionsInRange,
} from '@/journal/sessions/exchange-calendar';
import { addDays } from '@/journal/sessions/session-date';
import { toDecimal, toDecimalText } from '@/journal/money/decimal';
import { latestCloseAt } from '@/journal/sessions/session-clock';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { defaultOvernightShare } from '@/journal/volatility/overnight-share';
import { type DeskScope } from '@/server/database/desk-scope';
import { demoDesk, demoLessons, demoPeople, type DemoUnderlying, demoUnderlyings } from '@/server/demo/demo-scenario';
import { type DemoMoment, type DemoPlan, planDemoEntry, premiumOf } from '@/server/demo/plan-demo-entry';
import { type Random, seededRandom } from '@/server/demo/seeded-random';
import { simulateBars, type SimulatedBar } from '@/server/demo/simulate-bars';
import { emailKeyOf } from '@/server/people/people-store';
import { MembershipEntity } from '@/server/people/membership-entity';
import { MentorshipEntity } from '@/server/people/mentorship-entity';
import { BarStore } from '@/server/prices/bar-store';
import { type OnBarsChanged } from '@/server/prices/bars-changed';
import { type Clock } from '@/server/runtime/clock';
import { type Configuration } from '@/server/runtime/configuration';
import { systemIds } from '@/server/runtime/ids';
import { createServices } from '@/server/services';
import { UnderlyingStore } from '@/server/underlyings/underlying-store';
import { type DeskSettings } from '@/shared/desk/desk-settings';
import { type DraftLeg } from '@/shared/entries/draft-plan';

const SESSIONS = 510;
const ENTRIES = 38;
const DRAFTS = 3;
const SEED = 20_261_209;

/** Loads the invented desk into an empty database: people, two years of bars, entries in every state. */
export async function loadDemo({
  configuration,
  dataSource,
  now,
}: {
  configuration: Configuration;
  dataSource: DataSource;
  now: Date;
}): Promise<boolean> {
  if (configuration.NODE_ENV === 'production') throw new Error('The demo desk is for development only.');
  // Entries are written through the same services as a person's, each at its own time.
  let time = now;
  const clock: Clock = { now: () => time };
  const services = createServices({ configuration, dataSource, clock, ids: systemIds });
  try {
    if ((await services.people.count()) > 0) return false;
    const lastSession = latestCloseAt({ calendar: usOptionsCalendar, at: now.toISOString() });
    const sessions = sessionsInRange(usOptionsCalendar, {
      from: addDays(lastSession.date, -760),
      through: lastSession.date,
    }).slice(-SESSIONS);
    time = new Date(sessions[0]?.opensAt ?? now);
    const { trader, settings } = await makePeople(services, dataSource, clock);
    const random = seededRandom(SEED);
    const markets = await makeMarkets(trader, sessions, random, clock);
    const writer = new DemoWriter({
      services,
      scope: trader,
      settings,
      random,
      setTime: (instant) => (time = new Date(instant)),
    });
    const moments = momentsOf(markets, sessions, random);
    for (const moment of moments) await writer.write(moment);
    time = now;
    const correction = await mistypeLastClose(trader, moments.at(-1)?.market, clock);
    // Each entry knows the bars up to its last fill; those since come now.
    for (const { id } of markets)
      await services.onBarsChanged(trader, { underlyingId: id, fromSessionDate: sessions[0]?.date ?? '', prices: [] });
    if (correction !== null) await correction(services.onBarsChanged);
    await writer.writeDrafts(markets, lastSession);
    return true;
  } finally {
    await services.close();
  }
}

type Services = ReturnType<typeof createServices>;

async function makePeople(
  services: Services,
  dataSource: DataSource,
  clock: Clock,
): Promise<{ trader: DeskScope; settings: DeskSettings }> {
  const deskId = systemIds.next();
  const createdAt = clock.now();
  const people = demoPeople.map((person) => ({ ...person, id: systemIds.next() }));
  const passwordHash = await services.hasher.hash(demoDesk.password);
  const settings: DeskSettings = {
    name: demoDesk.name,
    currency: demoDesk.currency,
    ratePerYear: 0.04,
    overnightShare: defaultOvernightShare,
    feePerContract: '0.65',
    version: 1,
  };
  await services.people.inTransaction(async (store, manager) => {
    for (const { id, email, displayName } of people) {
      await store.addPerson({
        id,
        email,
        emailKey: emailKeyOf(email),
        displayName,
        timeZone: 'America/New_York',
        passwordHash,
        sessionEpoch: 0,
        disabledAt: null,
        createdAt,
      });
    }
    const [first, ...others] = people.map(({ id, role }) => ({
      id: systemIds.next(),
      deskId,
      personId: id,
      role,
      createdAt,
    }));
    if (first === undefined) throw new Error('The demo desk has people.');
    await store.addDesk({ id: deskId, createdAt, ...settings }, first);
    for (const membership of others) await manager.insert(MembershipEntity, membership);
    const idOf = (key: string) => people.find((person) => person.key === key)?.id ?? '';
    await manager.insert(MentorshipEntity, {
      id: systemIds.next(),
      deskId,
      mentorId: idOf('mentor'),
      traderId: idOf('trader'),
      acceptedAt: createdAt,
      revokedAt: null,
    });
  });
  const trader = people.find(({ key }) => key === 'trader');
  if (trader === undefined) throw new Error('The demo desk has a trader.');
  const scope = services.scopes.of({ personId: trader.id, displayName: trader.displayName, deskId, role: trader.role });
  return { trader: scope, settings };
}

interface Market {
  readonly underlying: DemoUnderlying;
  readonly id: string;
  readonly bars: readonly SimulatedBar[];
}

async function makeMarkets(
  scope: DeskScope,
  sessions: readonly ExchangeSession[],
  random: Random,
  clock: Clock,
): Promise<Market[]> {
  const markets: Market[] = [];
  for (const underlying of demoUnderlyings) {
    const id = systemIds.next();
    const bars = simulateBars(
      underlying,
      sessions.map(({ date }) => date),
      random,
    );
    await scope.inTransaction(async (inner) => {
      await new UnderlyingStore(inner).insert({ id, createdAt: clock.now(), fields: underlying.fields });
      await new BarStore(inner).write(
        bars.map((bar, index) => ({
          id: systemIds.next(),
          underlyingId: id,
          ...bar,
          settlement: null,
          source: 'demo',
          storedAt: new Date(sessions[index]?.closesAt ?? clock.now()),
        })),
        { withSettlement: true },
      );
    });
    markets.push({ underlying, id, bars });
  }
  return markets;
}

/** Stores the last close of a market wrongly, for an outcome that changes; gives the correction. */
async function mistypeLastClose(
  scope: DeskScope,
  market: Market | undefined,
  clock: Clock,
): Promise<((tell: OnBarsChanged) => Promise<void>) | null> {
  const bar = market?.bars.at(-1);
  if (market === undefined || bar === undefined) return null;
  const store = (close: string) =>
    new BarStore(scope).write(
      [
        {
          id: systemIds.next(),
          underlyingId: market.id,
          ...bar,
          close,
          settlement: null,
          source: 'typed',
          storedAt: clock.now(),
        },
      ],
      { withSettlement: true },
    );
  const { sessionDate, close: after } = bar;
  // Inside the session's range whatever it was.
  const before = toDecimalText(toDecimal(bar.low).plus(bar.high).dividedBy(2).toDecimalPlaces(2));
  if (before === after) return null;
  await store(before);
  return async (tell) => {
    await store(after);
    const prices = [{ sessionDate, field: 'close', before, after } as const];
    await tell(scope, { underlyingId: market.id, fromSessionDate: sessionDate, prices });
  };
}

type MarketMoment = DemoMoment & { readonly market: Market };

/** The closes at which plans are written, in order of time, the last ones near the end so that some still run. */
function momentsOf(markets: readonly Market[], sessions: readonly ExchangeSession[], random: Random): MarketMoment[] {
  const indices = Array.from(
    { length: ENTRIES },
    (_, index) => sessions.length - 3 - Math.round((index / ENTRIES) ** 1.4 * 190),
  ).sort((left, right) => left - right);
  return indices.flatMap((index) => {
    const session = sessions[index];
    return session === undefined ? [] : [momentAt(random.pick(markets), session, random)];
  });
}

function momentAt(market: Market, session: ExchangeSession, random: Random): MarketMoment {
  const until = market.bars.filter(({ sessionDate }) => sessionDate <= session.date).map(({ close }) => Number(close));
  const realised = closeDailyVolatility(logReturns(until.slice(-64)), { mean: 'sample' });
  return {
    market,
    underlying: market.underlying,
    underlyingId: market.id,
    sessionDate: session.date,
    closesAt: session.closesAt,
    close: until.at(-1) ?? market.underlying.startPrice,
    impliedVolatility: realised * (1 + 0.2 * random.next()),
  };
}

interface WriterParts {
  readonly services: Services;
  readonly scope: DeskScope;
  readonly settings: DeskSettings;
  readonly random: Random;
  readonly setTime: (instant: string) => void;
}

/** Writes entries the way a person would: plan, seal, fills, lesson. */
class DemoWriter {
  private count = 0;

  constructor(private readonly parts: WriterParts) {}

  async write(moment: MarketMoment): Promise<void> {
    const { services, scope, settings, random, setTime } = this.parts;
    this.count += 1;
    const demo = planDemoEntry(moment, settings, random, systemIds.next);
    const entryId = systemIds.next();
    const isLate = this.count % 17 === 0;
    const next = nextSession(usOptionsCalendar, moment.sessionDate);
    setTime(isLate ? later(next.opensAt, 60) : later(moment.closesAt, 30)); // late: after the fills of the open
    const draft = await services.entries.create(scope, { id: entryId, plan: demo.plan });
    await services.seals.seal(scope, { entryId, version: draft.row.version, requestId: 'demo' });
    if (this.count % 9 === 5) {
      setTime(later(moment.closesAt, 60 * 24));
      const current = await services.entries.read(scope, entryId);
      await services.entries.abandon(scope, { entryId, version: current.row.version, requestId: 'demo' });
      return;
    }
    if (this.count === ENTRIES) return; // sealed and not yet traded
    await this.trade(entryId, moment, demo);
  }

  async writeDrafts(markets: readonly Market[], session: ExchangeSession): Promise<void> {
    const { services, scope, settings, random } = this.parts;
    for (const market of markets.slice(0, DRAFTS)) {
      const { plan } = planDemoEntry(momentAt(market, session, random), settings, random, systemIds.next);
      await services.entries.create(scope, { id: systemIds.next(), plan: { ...plan, spotPrice: '', spotAt: '' } });
    }
  }

  /** Opens on the next session, and closes on the planned day or lets it expire, as far as the bars go. */
  private async trade(entryId: string, moment: MarketMoment, demo: DemoPlan): Promise<void> {
    const { services, scope, random, setTime } = this.parts;
    const after = moment.market.bars.filter(({ sessionDate }) => sessionDate > moment.sessionDate);
    const [entryBar] = after;
    if (entryBar === undefined) return;
    const opensAt = usOptionsCalendar.sessionOn(entryBar.sessionDate)?.opensAt ?? moment.closesAt;
    // Most wait for their price; some pay up.
    const slippage = random.next() < 0.65 ? 0 : 0.01;
    for (const leg of demo.plan.legs)
      await this.fill(entryId, moment, leg, {
        kind: leg.side,
        price: worse(leg, slippage),
        at: later(opensAt, 22),
        underlyingPrice: moment.close.toFixed(2),
      });

    const exitBar =
      after[
        Math.min(
          demo.holdingSessions,
          countSessions(usOptionsCalendar, { after: moment.sessionDate, through: demo.expirySessionDate }),
        ) - 1
      ];
    if (exitBar === undefined) return; // still running
    const isExpiry = exitBar.sessionDate === demo.expirySessionDate;
    const exitSession = usOptionsCalendar.sessionOn(exitBar.sessionDate);
    if (exitSession === null) return;
    const spot = Number(exitBar.close);
    const intrinsicOf = ({ type, strikePrice }: DraftLeg) =>
      Math.max(0, type === 'call' ? spot - Number(strikePrice) : Number(strikePrice) - spot);
    // What expires without value ends at the close, after what was traded that day.
    const inOrder = [...demo.plan.legs].sort((left, right) => intrinsicOf(right) - intrinsicOf(left));
    for (const leg of inOrder) {
      const strike = Number(leg.strikePrice);
      const intrinsic = intrinsicOf(leg);
      const sessionsLeft = countSessions(usOptionsCalendar, {
        after: exitBar.sessionDate,
        through: demo.expirySessionDate,
      });
      if (isExpiry && intrinsic < 0.01) {
        await this.fill(entryId, moment, leg, {
          kind: 'expiry',
          price: '0',
          at: exitSession.closesAt,
          underlyingPrice: null,
        });
        continue;
      }
      const value = isExpiry
        ? intrinsic
        : premiumOf(
            {
              ...moment,
              close: spot,
              closesAt: exitSession.closesAt,
              type: leg.type,
              strike,
              expirySessionDate: demo.expirySessionDate,
              sessions: sessionsLeft,
            },
            this.parts.settings,
          );
      const closing: DraftLeg = {
        ...leg,
        side: leg.side === 'buy' ? 'sell' : 'buy',
        premium: Math.max(0.01, value).toFixed(2),
      };
      await this.fill(entryId, moment, closing, {
        kind: closing.side,
        price: worse(closing, 0.01),
        at: later(exitSession.closesAt, -4),
        underlyingPrice: exitBar.close,
      });
    }
    if (random.next() < 0.9) {
      setTime(later(exitSession.closesAt, 90));
      const current = await services.entries.read(scope, entryId);
      await services.entries.saveLesson(scope, {
        entryId,
        version: current.row.version,
        lesson: random.pick(demoLessons),
      });
    }
  }

  private async fill(
    entryId: string,
    { underlying }: DemoMoment,
    leg: DraftLeg,
    {
      kind,
      price,
      at,
      underlyingPrice,
    }: { kind: 'buy' | 'sell' | 'expiry'; price: string; at: string; underlyingPrice: string | null },
  ): Promise<void> {
    const { services, scope, setTime } = this.parts;
    setTime(later(at, 3));
    const { symbol, multiplier } = underlying.fields;
    await services.fills.add(scope, {
      entryId,
      requestId: 'demo',
      fill: {
        id: systemIds.next(),
        kind,
        instrument: {
          kind: 'option',
          underlyingSymbol: symbol,
          expirySessionDate: leg.expirySessionDate,
          type: leg.type,
          strikePrice: leg.strikePrice,
          multiplier,
        },
        quantity: leg.quantity,
        price,
        fees: kind === 'expiry' ? '0' : (0.65 * Number(leg.quantity)).toFixed(2),
        tradedAt: at,
        timeZone: 'America/New_York',
        underlyingPrice,
        midPrice: kind === 'expiry' ? null : leg.premium,
      },
    });
  }
}

const later = (instant: string, minutes: number) => new Date(Date.parse(instant) + minutes * 60_000).toISOString();

/** A fill a little worse than the quote: a buyer pays more, a seller gets less. */
function worse({ side, premium }: DraftLeg, slippage: number): string {
  return Math.max(0.01, Number(premium) + (side === 'buy' ? slippage : -slippage)).toFixed(2);
}
