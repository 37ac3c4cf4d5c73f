import { useState } from 'react';
import { View } from 'react-native';
import { capital, cutWords, horizonWords } from '@/components/scores/score-words';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { formatNumber, formatPercent } from '@/components/ui/number-format';
import { Segmented } from '@/components/ui/segmented';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { useLayout } from '@/components/ui/use-layout';
import { type ScoreFilter, scoreFilterSchema } from '@/shared/scores/score-filter';
import { cutKinds, type CutKind, type Scores } from '@/shared/scores/scores';

type Cut = Scores['cuts'][CutKind][number];

const filterNames = {
  structure: 'structureKind',
  underlying: 'underlyingId',
  horizon: 'horizonClass',
  tag: 'tag',
} as const satisfies Record<CutKind, keyof ScoreFilter>;

interface Props {
  readonly scores: Scores;
  readonly filter: ScoreFilter;
  readonly onFilter: (filter: ScoreFilter) => void;
}

/** The record by structure, underlying, horizon and tag; each name narrows the page to its entries. */
export function CutsCard({ scores, filter, onFilter }: Props) {
  const isPhone = useLayout().kind === 'phone';
  const [kind, setKind] = useState<CutKind>('structure');
  const cuts = scores.cuts[kind];
  const narrow = (value: string) => {
    const read = scoreFilterSchema.safeParse({ ...filter, [filterNames[kind]]: value });
    if (read.success) onFilter(read.data);
  };
  const standing = cuts.filter(({ figures }) => figures?.standsOut === true);
  return (
    <Card title={`By ${cutWords[kind].toLowerCase()}`} subtitle="Rates need 20 resolved calls">
      <View style={{ gap: 10 }}>
        <Segmented
          label="Cut by"
          hideLabel
          value={kind}
          options={cutKinds.map((value) => ({ value, label: cutWords[value] }))}
          onChange={setKind}
        />
        {cuts.length === 0 ? (
          <Txt size="row" colour="inkSoft">
            {kind === 'tag' ? 'No resolved forecast has a tag.' : 'No forecast is resolved.'}
          </Txt>
        ) : (
          <DataTable
            caption={`Resolved calls by ${cutWords[kind].toLowerCase()}`}
            columns={[
              { key: 'what', header: cutWords[kind], flex: isPhone ? 1.6 : 2.4 },
              { key: 'n', header: 'n', align: 'right', flex: 0.7 },
              ...(isPhone ? [] : [{ key: 'effective', header: 'Counts for', align: 'right' as const }]),
              ...(isPhone ? [] : [{ key: 'stated', header: 'Stated', align: 'right' as const }]),
              { key: 'came', header: 'Came true', align: 'right', flex: 1.7 },
              { key: 'brier', header: 'Brier', align: 'right', flex: 0.9 },
            ]}
            rows={cuts.map((cut) => ({
              key: cut.value,
              cells: {
                what: <Button kind="text" label={labelOf(kind, cut)} onPress={() => narrow(cut.value)} />,
                n: String(cut.count),
                effective: cut.figures === null ? '' : formatNumber(cut.figures.effectiveCount, 0),
                stated: cut.figures === null ? '' : formatPercent(cut.figures.stated),
                came: <CameTrue cut={cut} showsStated={isPhone} />,
                brier: cut.figures === null ? '' : formatNumber(cut.figures.brierScore, 3),
              },
            }))}
          />
        )}
        {cuts.some(({ figures }) => figures !== null) ? (
          <Txt size="row" colour="inkSoft">
            {standing.length === 0
              ? 'Looked at together, none is farther off than chance explains.'
              : `Farther off than chance explains, all cuts looked at together: ${standing.map((cut) => labelOf(kind, cut)).join(', ')}.`}
          </Txt>
        ) : null}
      </View>
    </Card>
  );
}

function CameTrue({ cut: { figures }, showsStated }: { cut: Cut; showsStated: boolean }) {
  if (figures === null) {
    return (
      <Txt size="note" colour="inkSoft" align="right">
        too few for a rate
      </Txt>
    );
  }
  return (
    <View>
      <Txt size="row" weight="semibold" align="right">
        {formatPercent(figures.observed)}
      </Txt>
      <Txt size="note" colour="inkSoft" align="right">
        {`${formatPercent(figures.low)} to ${formatPercent(figures.high)}${showsStated ? `, stated ${formatPercent(figures.stated)}` : ''}`}
      </Txt>
    </View>
  );
}

function labelOf(kind: CutKind, { value, label }: Cut): string {
  if (kind !== 'horizon') return kind === 'structure' ? capital(label) : label;
  const known = Object.entries(horizonWords).find(([name]) => name === value);
  return known?.[1] ?? label;
}
