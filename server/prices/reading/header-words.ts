import { type barColumns } from '@/shared/prices/price-upload';

type BarColumn = (typeof barColumns)[number];

/** What a header says its column holds. Lower rank is preferred where several columns could be the close. */
export interface HeaderMeaning {
  readonly column: Exclude<BarColumn, 'ignore'>;
  readonly rank: number;
}

/** Ranks of closes; from `settlement` on, the value may lie outside the session's range. */
export const closeRank = { close: 0, last: 1, settlement: 2, adjusted: 3 } as const;

const words: readonly (readonly [HeaderMeaning['column'], number, readonly string[]])[] = [
  [
    'date',
    0,
    [
      'date',
      'session date',
      'trade date',
      'trading date',
      'business date',
      'session',
      'day',
      'datum',
      'handelstag',
      'handelsdatum',
      'tag',
      'jour',
      'date de seance',
      'seance',
    ],
  ],
  ['date', 1, ['time', 'timestamp', 'datetime', 'date time', 'zeit', 'heure']],
  [
    'open',
    0,
    [
      'open',
      'opening',
      'open price',
      'opening price',
      'eroffnung',
      'eroffnungskurs',
      'erster',
      'ouverture',
      'cours d ouverture',
    ],
  ],
  [
    'high',
    0,
    [
      'high',
      'highest',
      'high price',
      'day high',
      'hoch',
      'hochst',
      'hochster',
      'hochstkurs',
      'tageshoch',
      'haut',
      'plus haut',
      'max',
      'maximum',
    ],
  ],
  [
    'low',
    0,
    [
      'low',
      'lowest',
      'low price',
      'day low',
      'tief',
      'tiefst',
      'tiefster',
      'tiefstkurs',
      'tagestief',
      'bas',
      'plus bas',
      'min',
      'minimum',
    ],
  ],
  [
    'close',
    closeRank.close,
    [
      'close',
      'closing',
      'close price',
      'closing price',
      'schluss',
      'schlusskurs',
      'schlussstand',
      'cloture',
      'cours de cloture',
    ],
  ],
  [
    'close',
    closeRank.last,
    [
      'last',
      'last price',
      'letzter',
      'letzter kurs',
      'zuletzt',
      'dernier',
      'dernier cours',
      'price',
      'kurs',
      'cours',
      'value',
      'level',
      'wert',
    ],
  ],
  [
    'close',
    closeRank.settlement,
    [
      'settle',
      'settlement',
      'settlement price',
      'settlement value',
      'settle price',
      'abrechnungspreis',
      'abrechnungskurs',
      'cours de compensation',
      'compensation',
    ],
  ],
  [
    'close',
    closeRank.adjusted,
    [
      'adj close',
      'adjusted close',
      'close adj',
      'close adjusted',
      'adj closing price',
      'adjusted closing price',
      'bereinigter schluss',
      'bereinigter schlusskurs',
      'schluss bereinigt',
      'cloture ajustee',
    ],
  ],
];

// A Map, not an object: headers such as __proto__ are only words here.
const meanings: ReadonlyMap<string, HeaderMeaning> = new Map(
  words.flatMap(([column, rank, texts]) => texts.map((text) => [text, { column, rank }] as const)),
);

const normalise = (text: string): string =>
  text
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/ß/g, 'ss')
    .toLowerCase()
    .replace(/\(.*?\)|\[.*?\]/g, ' ') // a unit or currency in brackets
    .replace(/[^a-z]+/g, ' ')
    .trim();

export const headerMeaning = (text: string): HeaderMeaning | null => meanings.get(normalise(text)) ?? null;
