import { type Href } from 'expo-router';
import { View } from 'react-native';
import { anchorOf } from '@/components/entry/entry-sections';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Icon } from '@/components/ui/icon';
import { withDatesInWords } from '@/components/ui/number-format';
import { focusHeading } from '@/components/ui/section-links';
import { Txt } from '@/components/ui/text';
import { systemClock } from '@/hooks/client/clock';
import { latestCloseAt } from '@/journal/sessions/session-clock';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type OutcomeWait, outcomeWaits } from '@/shared/entries/outcome-waits';

/** What the outcome cannot be told without, each with the way to bring it; nothing once all is known. */
export function WaitsSection({ entry }: { entry: SealedEntry }) {
  const { outcome, row, isOwn } = entry;
  const waits = outcomeWaits({
    outcome,
    expirySessionDate: row.expirySessionDate,
    lastFillAt: row.lastFillAt,
    lastClosedSessionDate: latestCloseAt({ calendar: usOptionsCalendar, at: systemClock.now() }).date,
  });
  if (waits.length === 0) return null;
  const due = waits.filter(({ isDue }) => isDue).length;
  return (
    <Card
      title="Waits for"
      subtitle={due === 0 ? 'Nothing is due yet' : `${due} of ${waits.length} could be there by now`}
    >
      <View role="list" style={{ gap: 8 }}>
        {waits.map((wait) => (
          <View
            key={wait.what}
            role="listitem"
            style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 12, minHeight: 28 }}
          >
            <Icon name={wait.isDue ? 'warning' : 'clock'} size={18} colour={wait.isDue ? 'amber' : 'inkSoft'} />
            <Txt size="row" style={{ flexShrink: 1 }}>
              {`${row.underlying.symbol}: ${withDatesInWords(wait.what)}${wait.isDue ? '' : ', not due yet'}`}
            </Txt>
            {isOwn && wait.isDue ? <Mend wait={wait} underlyingId={row.underlying.id} /> : null}
          </View>
        ))}
      </View>
    </Card>
  );
}

function Mend({ wait, underlyingId }: { wait: OutcomeWait; underlyingId: string }) {
  if (wait.mend === 'fill')
    return <Button kind="text" label="Go to the fills" onPress={() => focusHeading(anchorOf('fills'))} />;
  const typed: Href = {
    pathname: '/prices/[underlyingId]',
    params: { underlyingId, session: wait.sessionDate },
  };
  return (
    <>
      {wait.mend === 'bars' ? (
        <Button
          kind="text"
          label="Upload bars"
          href={{ pathname: '/prices/[underlyingId]/upload', params: { underlyingId } }}
        />
      ) : null}
      <Button kind="text" label={wait.mend === 'bars' ? 'Type the bar' : 'Type the value'} href={typed} />
    </>
  );
}
