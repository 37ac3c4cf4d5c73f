import { Temporal } from 'temporal-polyfill';
import { type z } from 'zod';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { toDecimal } from '@/journal/money/decimal';
import { type EntryFill } from '@/shared/entries/entry';
import { type entryEndpoints } from '@/shared/entries/entry-endpoints';
import { type PlanProblem } from '@/shared/entries/plan-problem';
import { readTypedNumber } from '@/shared/entries/typed-number';

/** A fill as it is typed. `contract` is the id of a planned leg, or 'shares'. */
export interface FillForm {
  readonly kind: EntryFill['kind'];
  readonly contract: string;
  readonly quantity: string;
  readonly price: string;
  readonly fees: string;
  readonly date: string;
  /** 24 hours, HH:MM or HH:MM:SS. */
  readonly time: string;
  readonly timeZone: string;
  /** Empty where it is not noted. */
  readonly underlyingPrice: string;
  readonly midPrice: string;
}
export type NewFill = z.output<(typeof entryEndpoints.addFill)['body']>;

const EXCHANGE_ZONE = 'America/New_York';

/**
 * A form for the next fill: the first leg that has none yet, opened as planned; afterwards the closing side.
 * @param now instant shown as the time of the fill, in the exchange's zone
 */
export function newFillForm(input: ForecastInput, fills: readonly EntryFill[], now: string): FillForm {
  const hasFill = (strike: string, type: string) =>
    fills.some(
      ({ instrument }) =>
        instrument.kind === 'option' && Number(instrument.strikePrice) === Number(strike) && instrument.type === type,
    );
  const unfilled = input.legs.find((leg) => !hasFill(leg.strikePrice, leg.type));
  const leg = unfilled ?? input.legs[0];
  if (leg === undefined) throw new Error('A sealed plan has at least one leg.');
  const at = Temporal.Instant.from(now).toZonedDateTimeISO(EXCHANGE_ZONE);
  const opens = unfilled !== undefined;
  return {
    kind: opens === (leg.side === 'buy') ? 'buy' : 'sell',
    contract: leg.id,
    quantity: String(leg.quantity),
    price: opens ? leg.premium : '',
    fees: toDecimal(input.feePerContract).times(leg.quantity).toFixed(2),
    date: at.toPlainDate().toString(),
    time: at.toPlainTime().toString({ smallestUnit: 'minute' }),
    timeZone: EXCHANGE_ZONE,
    underlyingPrice: '',
    midPrice: '',
  };
}

export type FillReading =
  | { readonly kind: 'complete'; readonly fill: NewFill }
  | { readonly kind: 'incomplete'; readonly problems: readonly PlanProblem[] };

/** Reads the form as a fill, or lists every field that is missing or wrong. */
export function readFillForm(form: FillForm, { id, input }: { id: string; input: ForecastInput }): FillReading {
  const problems: PlanProblem[] = [];
  const report = (field: string, message: string) => void problems.push({ field, message });
  const amount = (
    field: 'quantity' | 'price' | 'fees' | 'underlyingPrice' | 'midPrice',
    text: string,
    above: boolean,
  ) => {
    const value = readTypedNumber(text);
    if (value === null) report(field, 'Type a number such as 1.25.');
    else if (above && !(value > 0)) report(field, 'Must be above 0.');
    else if (field !== 'fees' && value < 0) report(field, 'Must be 0 or more.');
    return text.trim().replace(/^−/, '-');
  };
  const quantity = amount('quantity', form.quantity, true);
  const price = form.kind === 'expiry' ? '0' : amount('price', form.price, false);
  const fees = amount('fees', form.fees === '' ? '0' : form.fees, false);
  const noted = (field: 'underlyingPrice' | 'midPrice') =>
    form[field].trim() === '' ? null : amount(field, form[field], field === 'underlyingPrice');
  const [underlyingPrice, midPrice] = [noted('underlyingPrice'), noted('midPrice')];
  const tradedAt = readTime(form, report);
  const leg = input.legs.find((candidate) => candidate.id === form.contract);
  if (leg === undefined && form.kind !== 'buy' && form.kind !== 'sell') {
    report('contract', 'Only an option expires or is exercised. Choose its contract.');
  }
  if (problems.length > 0 || tradedAt === null) return { kind: 'incomplete', problems };
  const { symbol, multiplier } = input.underlying;
  const instrument: NewFill['instrument'] =
    leg === undefined
      ? { kind: 'stock', symbol, multiplier: '1' }
      : {
          kind: 'option',
          underlyingSymbol: symbol,
          expirySessionDate: leg.expirySessionDate,
          type: leg.type,
          strikePrice: leg.strikePrice,
          multiplier,
        };
  return {
    kind: 'complete',
    fill: {
      id,
      kind: form.kind,
      instrument,
      quantity,
      price,
      fees,
      tradedAt,
      timeZone: form.timeZone,
      underlyingPrice,
      midPrice,
    },
  };
}

/** The instant of a local date and time; a time that does not exist or exists twice in the zone is asked about. */
function readTime({ date, time, timeZone }: FillForm, report: (field: string, message: string) => void): string | null {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(date)) {
    report('date', 'Choose the date of the fill.');
    return null;
  }
  if (!/^([01]\d|2[0-3]):[0-5]\d(:[0-5]\d)?$/.test(time.trim())) {
    report('time', 'Write the time in 24 hours, such as 15:52.');
    return null;
  }
  try {
    const local = Temporal.PlainDateTime.from(`${date}T${time.trim()}`, { overflow: 'reject' });
    const instant = local.toZonedDateTime(timeZone, { disambiguation: 'reject' }).toInstant();
    return instant.toString({ fractionalSecondDigits: 3 });
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    report(
      'time',
      `${date} ${time} does not exist, or exists twice, in ${timeZone}. Choose UTC and type the time in UTC.`,
    );
    return null;
  }
}
