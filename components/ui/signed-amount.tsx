import { HiddenText } from '@/components/ui/hidden-text';
import { formatMoney } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { type TextSize } from '@/components/ui/theme/metrics';

interface Props {
  /** A decimal text or a number; null where there is none yet. */
  readonly value: string | number | null;
  readonly currency: string;
  readonly size?: TextSize;
  /** The big figure of a screen stands alone and names its currency; in rows the block has named it. */
  readonly showCurrency?: boolean;
  readonly places?: number;
}

/** Profit or loss: sign and colour for the eye, words for the ear. */
export function SignedAmount({ value, currency, size = 'body', showCurrency = size === 'figure', places }: Props) {
  if (value === null || !Number.isFinite(Number(value))) {
    return (
      <Txt size={size} colour="inkSoft" align="right">
        <span aria-hidden>–</span>
        <HiddenText>no amount yet</HiddenText>
      </Txt>
    );
  }
  const number = Number(value);
  const word = number > 0 ? 'profit of' : number < 0 ? 'loss of' : 'even,';
  return (
    <Txt
      size={size}
      serif={size === 'figure'}
      weight="semibold"
      align="right"
      numberOfLines={1}
      colour={number > 0 ? 'tide' : number < 0 ? 'rust' : 'ink'}
    >
      <span aria-hidden>
        {formatMoney(value, { sign: true, places })}
        {showCurrency ? <span style={{ fontSize: '0.6em' }}>{` ${currency}`}</span> : null}
      </span>
      <HiddenText>{`${word} ${formatMoney(unsigned(value), { currency, places })}`}</HiddenText>
    </Txt>
  );
}

const unsigned = (value: string | number) => (typeof value === 'number' ? Math.abs(value) : value.replace('-', ''));
