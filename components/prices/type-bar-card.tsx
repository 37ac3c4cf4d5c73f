import { useEffect, useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { DateField } from '@/components/ui/date-field';
import { TextField } from '@/components/ui/field';
import { focusHeading } from '@/components/ui/section-links';
import { Txt } from '@/components/ui/text';
import { useToast } from '@/components/ui/toast';
import { usePutBar } from '@/hooks/underlyings/use-underlyings';
import { nextSession } from '@/journal/sessions/exchange-calendar';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type UnderlyingDetail } from '@/shared/underlyings/underlying-endpoints';

const fields = [
  ['close', 'Close'],
  ['open', 'Open (optional)'],
  ['high', 'High (optional)'],
  ['low', 'Low (optional)'],
  ['settlement', 'Settlement value (if not the close)'],
] as const;
type Prices = Record<(typeof fields)[number][0], string>;
const ANCHOR = 'section-type-a-bar';
const nothing: Prices = { close: '', open: '', high: '', low: '', settlement: '' };

/** One session's prices, typed; typing a session again changes it. An address can name the session, which is brought into view. */
export function TypeBarCard({ detail, session }: { detail: UnderlyingDetail; session?: string }) {
  const toast = useToast();
  const put = usePutBar();
  const last = detail.bars.at(-1);
  const [sessionDate, setSessionDate] = useState(
    session ?? (last === undefined ? '' : nextSession(usOptionsCalendar, last.sessionDate).date),
  );
  const [prices, setPrices] = useState(() => storedPrices(detail, session));
  useEffect(() => {
    if (session !== undefined) focusHeading(ANCHOR);
  }, [session]);
  const textOrNull = (text: string) => (text.trim() === '' ? null : text.trim());
  const submit = () =>
    put.mutate(
      {
        params: { underlyingId: detail.underlying.id, sessionDate },
        body: {
          close: prices.close.trim(),
          open: textOrNull(prices.open),
          high: textOrNull(prices.high),
          low: textOrNull(prices.low),
          settlement: textOrNull(prices.settlement),
        },
      },
      {
        onSuccess: (bar) => {
          toast.show({ text: `${detail.underlying.symbol} ${bar.sessionDate}: close ${bar.close} stored.` });
          setPrices(nothing);
          setSessionDate(nextSession(usOptionsCalendar, bar.sessionDate).date);
        },
      },
    );
  const general =
    put.error?.problems.some(({ field }) => field === 'sessionDate' || field in nothing) === true ? null : put.error;
  return (
    <Card
      anchor={ANCHOR}
      title="Type a bar"
      subtitle={`In ${detail.underlying.currency}; typing a stored session again changes it`}
    >
      <View style={{ gap: 12 }}>
        {general === null || general === undefined ? null : (
          <Txt size="row" colour="rust" role="alert">
            {[general.message, ...general.problems.map(({ message }) => message), general.action].join(' ')}
          </Txt>
        )}
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 12 }}>
          <View style={{ flexGrow: 1, flexBasis: 150 }}>
            <DateField
              label="Session"
              value={sessionDate}
              onChange={setSessionDate}
              error={put.error?.problemOf('sessionDate')}
            />
          </View>
          {fields.map(([key, label]) => (
            <View key={key} style={{ flexGrow: 1, flexBasis: key === 'settlement' ? 240 : 130 }}>
              <TextField
                label={label}
                value={prices[key]}
                onChangeText={(text) => setPrices({ ...prices, [key]: text })}
                error={put.error?.problemOf(key)}
                inputMode="decimal"
              />
            </View>
          ))}
        </View>
        <View style={{ flexDirection: 'row' }}>
          <Button
            kind="secondary"
            label="Store bar"
            busy={put.isPending}
            busyLabel="Storing …"
            disabled={sessionDate === '' || prices.close.trim() === ''}
            onPress={submit}
          />
        </View>
      </View>
    </Card>
  );
}

/** What a session has already, so that one price can be added to it without typing the others again. */
function storedPrices({ bars }: UnderlyingDetail, session: string | undefined): Prices {
  const bar = bars.find(({ sessionDate }) => sessionDate === session);
  if (bar === undefined) return nothing;
  const { close, open, high, low, settlement } = bar;
  return { close, open: open ?? '', high: high ?? '', low: low ?? '', settlement: settlement ?? '' };
}
