import { useState } from 'react';
import { View } from 'react-native';
import { EntryLink } from '@/components/scores/entry-link';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { formatDate, formatOdds } from '@/components/ui/number-format';
import { DataTable } from '@/components/ui/table';
import { useLayout } from '@/components/ui/use-layout';
import { type Scores } from '@/shared/scores/scores';

const STEP = 30;

/** Every resolved forecast, each leading to its entry. */
export function ResolvedList({ scores }: { scores: Scores }) {
  const isPhone = useLayout().kind === 'phone';
  const [shown, setShown] = useState(STEP);
  return (
    <Card
      title="Resolved forecasts"
      subtitle={
        scores.resolvedCount > scores.resolved.length
          ? `The newest ${scores.resolved.length} of ${scores.resolvedCount}`
          : 'Newest first'
      }
    >
      <View style={{ gap: 12 }}>
        <DataTable
          caption="Resolved forecasts"
          columns={[
            { key: 'what', header: 'Forecast', flex: 3 },
            ...(isPhone ? [] : [{ key: 'due', header: 'Due', align: 'right' as const }]),
            { key: 'said', header: 'Said', align: 'right' },
            ...(isPhone ? [] : [{ key: 'market', header: 'Market', align: 'right' as const }]),
            { key: 'happened', header: 'Came', align: 'right' },
            { key: 'brier', header: 'Brier', align: 'right' },
          ]}
          rows={scores.resolved.slice(0, shown).map((item) => ({
            key: `${item.entryId} ${item.key}`,
            cells: {
              what: (
                <EntryLink entryId={item.entryId} text={`${item.symbol} ${item.structureName}: ${item.statement}`} />
              ),
              due: formatDate(item.dueSessionDate, 'withYear'),
              said: formatOdds(item.probability),
              market: item.marketImplied === null ? '–' : formatOdds(item.marketImplied),
              happened: item.happened ? 'yes' : 'no',
              brier: item.brierScore.toFixed(3),
            },
            note: item.isLateSeal ? 'sealed late, not scored' : undefined,
          }))}
        />
        {scores.resolved.length > shown ? (
          <View style={{ flexDirection: 'row' }}>
            <Button
              kind="secondary"
              label={`Show ${Math.min(STEP, scores.resolved.length - shown)} more`}
              onPress={() => setShown(shown + STEP)}
            />
          </View>
        ) : null}
      </View>
    </Card>
  );
}
