const minus = '−';
const absent = '–';
const months = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];
const weekdays = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'];

interface SignOption {
  /** Puts a plus before what is above 0. */
  readonly sign?: boolean;
}

interface MoneyOptions extends SignOption {
  /** Named after the amount: beside an amount that stands alone. */
  readonly currency?: string;
  /** Decimals; without it a text keeps its own, at least two, and a number has two. */
  readonly places?: number;
}

/** "1,204.50", "+318.35 USD", "−593.28"; a decimal text is never turned into a number unless `places` cuts it. */
export function formatMoney(value: string | number, { currency, sign, places }: MoneyOptions = {}): string {
  const text =
    typeof value === 'string' && places === undefined ? ownDecimals(value) : fixed(Number(value), places ?? 2);
  if (text === null) return absent;
  const amount = withSign(text, sign);
  return currency === undefined ? amount : `${amount} ${currency}`;
}

/** "12,480", "−0.25"; without `places` a whole number has none and any other number at most four. */
export function formatNumber(value: number, places?: number, { sign }: SignOption = {}): string {
  const text = fixed(value, places ?? 4);
  if (text === null) return absent;
  return withSign(places === undefined ? trimZeros(text, 0) : text, sign);
}

/** A fraction as percent: 0.0172 with 2 places is "1.72%". */
export function formatPercent(fraction: number, places = 0, { sign }: SignOption = {}): string {
  const text = fixed(fraction * 100, places);
  return text === null ? absent : `${withSign(text, sign)}%`;
}

/** A probability in whole percents between 1 and 99, else "<1%" or ">99%". */
export function formatOdds(probability: number): string {
  if (!Number.isFinite(probability)) return absent;
  if (probability < 0.01) return '<1%';
  if (probability > 0.99) return '>99%';
  return `${Math.round(probability * 100)}%`;
}

/** "+0.95σ": a move in units of its own deviation. */
export function formatSigma(sigmas: number, places = 2): string {
  const text = fixed(sigmas, places);
  return text === null ? absent : `${withSign(text, true)}σ`;
}

export type DateStyle = 'short' | 'weekday' | 'withYear' | 'long' | 'full';

/**
 * A 'YYYY-MM-DD' date: short "9 Dec", weekday "Wed 9 Dec", withYear "9 Dec 2026", long "9 December 2026",
 * full "Wednesday 9 December 2026". A text that is no date comes back as it is.
 */
export function formatDate(date: string, style: DateStyle = 'short'): string {
  const parts = /^(\d{4})-(\d{2})-(\d{2})$/.exec(date);
  const [year, month, day] = (parts?.slice(1) ?? []).map(Number);
  const monthName = month === undefined ? undefined : months[month - 1];
  if (year === undefined || day === undefined || monthName === undefined) return date;
  const weekday = weekdays[new Date(`${date}T00:00:00Z`).getUTCDay()] ?? '';
  switch (style) {
    case 'short':
      return `${day} ${monthName.slice(0, 3)}`;
    case 'weekday':
      return `${weekday.slice(0, 3)} ${day} ${monthName.slice(0, 3)}`;
    case 'withYear':
      return `${day} ${monthName.slice(0, 3)} ${year}`;
    case 'long':
      return `${day} ${monthName} ${year}`;
    case 'full':
      return `${weekday} ${day} ${monthName} ${year}`;
  }
}

export type InstantStyle = 'dateTime' | 'withYear' | 'time' | 'date';

/**
 * An ISO instant on the clock of a time zone: dateTime "9 Dec, 15:52", withYear "9 Dec 2026, 15:52", time "15:52", date "9 Dec".
 * A text that is no instant comes back as it is.
 */
export function formatInstant(iso: string, timeZone: string, style: InstantStyle = 'dateTime'): string {
  const instant = new Date(iso);
  if (Number.isNaN(instant.getTime())) return iso;
  const parts = new Map(
    clockOf(timeZone)
      .formatToParts(instant)
      .map(({ type, value }) => [type, value]),
  );
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.get(type) ?? '';
  const date = `${part('year')}-${part('month')}-${part('day')}`;
  const time = `${part('hour')}:${part('minute')}`;
  switch (style) {
    case 'dateTime':
      return `${formatDate(date, 'short')}, ${time}`;
    case 'withYear':
      return `${formatDate(date, 'withYear')}, ${time}`;
    case 'time':
      return time;
    case 'date':
      return formatDate(date, 'short');
  }
}

const clocks = new Map<string, Intl.DateTimeFormat>();

function clockOf(timeZone: string): Intl.DateTimeFormat {
  const kept = clocks.get(timeZone);
  if (kept !== undefined) return kept;
  const clock = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  });
  clocks.set(timeZone, clock);
  return clock;
}

/** Plain decimal text, without a sign on zero; null for what is no finite number. */
function fixed(value: number, places: number): string | null {
  if (!Number.isFinite(value)) return null;
  // Beyond this toFixed turns to exponents; no amount of ours comes near.
  if (Math.abs(value) >= 1e21) return null;
  return value.toFixed(places);
}

function ownDecimals(text: string): string | null {
  const parts = /^(-?)0*(\d+)(?:\.(\d*))?$/.exec(text.trim());
  if (parts === null) return null;
  const [, sign = '', whole = '', decimals = ''] = parts;
  return trimZeros(`${sign}${whole}.${decimals.padEnd(2, '0')}`, 2);
}

/** Takes trailing zeros off, down to a least count of decimals. */
function trimZeros(text: string, least: number): string {
  const [whole = '', decimals = ''] = text.split('.');
  const kept = decimals.slice(0, least) + decimals.slice(least).replace(/0+$/, '');
  return kept === '' ? whole : `${whole}.${kept}`;
}

function withSign(text: string, showsPlus = false): string {
  const [whole = '', decimals] = text.replace('-', '').split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ',');
  const amount = decimals === undefined ? grouped : `${grouped}.${decimals}`;
  const isZero = /^[0.,]*$/.test(amount);
  if (isZero) return amount;
  return text.startsWith('-') ? `${minus}${amount}` : showsPlus ? `+${amount}` : amount;
}

/** A sentence with its ISO dates written as people write them: "waits for the close of 23 Dec". */
export function withDatesInWords(text: string): string {
  return text.replace(/\b\d{4}-\d{2}-\d{2}\b/g, (date) => formatDate(date));
}
