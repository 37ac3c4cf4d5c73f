import { type SealedEntry } from '@/components/entry/sealed-entry';
import { formatInstant, formatMoney } from '@/components/ui/number-format';

type Process = NonNullable<NonNullable<SealedEntry['outcome']>['process']>;

export interface ProcessMark {
  readonly title: string;
  readonly note: string;
  /** Null while it cannot be told. */
  readonly isKept: boolean | null;
}

const exitWords: Record<NonNullable<Process['exitTag']>, string> = {
  target: 'The target was reached',
  stop: 'The stop was reached',
  time: 'In the planned session',
  event: 'Ahead of the event',
  expiry: 'At expiry',
  unplanned: 'By no rule of the plan',
};

/** The marks of process with what they rest on. */
export function processMarks(process: Process, entry: SealedEntry, timeZone: string): ProcessMark[] {
  const { row, sealed } = entry;
  const { currency } = row.underlying;
  const { isSealedBeforeFill, size, limit, exitTag } = process;
  const when = (instant: string) => formatInstant(instant, timeZone);
  const tooLarge = size.legs.filter(({ isWithin }) => !isWithin).length;
  return [
    {
      title: 'Sealed before the first fill',
      note: `${when(sealed.receipt.sealedAt)}, first fill ${row.firstFillAt === null ? '–' : when(row.firstFillAt)}`,
      isKept: isSealedBeforeFill,
    },
    {
      title: 'Size inside the plan',
      note: size.isWithin
        ? 'No leg was ever larger than planned'
        : `${tooLarge} ${tooLarge === 1 ? 'series was' : 'series were'} larger than planned, or not in the plan`,
      isKept: size.isWithin,
    },
    {
      title: 'Price inside the limit',
      note: limit === null ? 'A leg has no opening fill' : limitWords(limit, currency),
      isKept: limit?.isWithin ?? null,
    },
    {
      title: 'Exit by a written rule',
      note: exitTag === null ? 'Told once the position is closed' : exitWords[exitTag],
      isKept: exitTag === null ? null : exitTag !== 'unplanned',
    },
  ];
}

function limitWords({ netPremium, limit, beyond }: NonNullable<Process['limit']>, currency: string): string {
  const amount = (text: string) => formatMoney(text.replace('-', ''), { currency });
  const verb = netPremium.startsWith('-') ? 'Received' : 'Paid';
  const planned = `${verb} ${amount(netPremium)}, planned ${amount(limit)}`;
  return Number(beyond) > 0 ? `${planned}: ${amount(beyond)} worse` : planned;
}
