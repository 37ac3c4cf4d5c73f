import { type ReactNode } from 'react';
import { View } from 'react-native';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { CalibrationCard } from '@/components/scores/calibration-card';
import { CoverageCard } from '@/components/scores/coverage-card';
import { CutsCard } from '@/components/scores/cuts-card';
import { MoneyCard, SourcesCard } from '@/components/scores/money-card';
import { PlacesCard } from '@/components/scores/places-card';
import { ProcessCard } from '@/components/scores/process-card';
import { ResolvedList } from '@/components/scores/resolved-list';
import { ScoreFilters } from '@/components/scores/score-filters';
import { ScorePartsCard } from '@/components/scores/score-parts-card';
import { entriesWord } from '@/components/scores/score-words';
import { VolatilityCard } from '@/components/scores/volatility-card';
import { Button } from '@/components/ui/button';
import { CautionLine } from '@/components/ui/caution-line';
import { formatNumber, formatPercent } from '@/components/ui/number-format';
import { EmptyState } from '@/components/ui/states';
import { Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';
import { useLayout } from '@/components/ui/use-layout';
import { useScores } from '@/hooks/scores/use-scores';
import { type ScoreFilter } from '@/shared/scores/score-filter';
import { type Scores } from '@/shared/scores/scores';

interface Props {
  readonly filter: ScoreFilter;
  readonly onFilter: (filter: ScoreFilter) => void;
}

/** Whether the odds come true: a sentence first, then every figure behind it, each leading to its entries. */
export function ScoresScreen({ filter, onFilter }: Props) {
  const { data: scores, error, isPending, refetch } = useScores(filter);
  if (isPending || error)
    return <UnreadyScreen title="Scores" loading="Loading scores" error={error} onRetry={refetch} />;
  const isFiltered = Object.keys(filter).length > 0;
  const isEmpty = scores.resolvedCount === 0 && scores.entries.every(({ moveDeviations }) => moveDeviations === null);
  return (
    <ScreenFrame title="Scores" note={noteOf(scores)}>
      <View style={{ gap: space.cardGap }}>
        {isEmpty && !isFiltered ? (
          <EmptyState
            title="No odds are resolved yet"
            text="Each sealed forecast states several odds. They resolve at the planned exit and at expiry, once the bars are there."
            action={{ label: 'See the journal', href: '/journal' }}
          />
        ) : (
          <>
            <Sentence scores={scores} filter={filter} onFilter={onFilter} />
            <ScoreFilters filter={filter} choices={scores.choices} onFilter={onFilter} />
            {isEmpty ? (
              <EmptyState
                title="Nothing resolved fits"
                text="No resolved forecast is left under these filters."
                action={{ label: 'Show all', onPress: () => onFilter({}) }}
              />
            ) : (
              <Figures scores={scores} filter={filter} onFilter={onFilter} />
            )}
          </>
        )}
        <CautionLine />
      </View>
    </ScreenFrame>
  );
}

function noteOf({ entryCount, odds, pendingCount, cannotTellCount, late }: Scores): string {
  return [
    entriesWord(entryCount),
    `${odds.count} odds resolved`,
    `${pendingCount} still to resolve`,
    ...(cannotTellCount > 0 ? [`${cannotTellCount} that daily bars cannot tell`] : []),
    ...(late.count > 0 ? [`${late.count} sealed late and kept apart`] : []),
  ].join(', ');
}

function Sentence({ scores, filter, onFilter }: Props & { scores: Scores }) {
  const { sentence, odds, late } = scores;
  return (
    <View style={{ maxWidth: 760, gap: 4 }}>
      <Txt serif size="head">
        {sentence}
      </Txt>
      {odds.sampleRule === 'provisional' ? (
        <Txt size="row" colour="inkSoft">
          Provisional: up to 50 cases a rate says little. Odds of one trade move together, so they count for less than
          their number.
        </Txt>
      ) : null}
      {odds.sampleRule === 'list-only' && odds.count > 0 ? (
        <View style={{ flexDirection: 'row' }}>
          {filter.evenIfFew === 'yes' ? (
            <Txt size="row" colour="inkSoft">
              The sums below are shown because you asked: from so few cases they say nothing yet.
            </Txt>
          ) : (
            <Button
              kind="text"
              label="Show the sums all the same"
              onPress={() => onFilter({ ...filter, evenIfFew: 'yes' })}
            />
          )}
        </View>
      ) : null}
      {late.figures === null ? null : (
        <Txt size="row" colour="inkSoft">
          {`Sealed late, scored apart: stated ${formatPercent(late.figures.stated)}, came true ${formatPercent(late.figures.observed)} of ${late.count}, Brier ${formatNumber(late.figures.brierScore, 3)}.`}
        </Txt>
      )}
    </View>
  );
}

function Figures({ scores, filter, onFilter }: Props & { scores: Scores }) {
  const { odds } = scores;
  return (
    <>
      {odds.figures === null ? null : (
        <Row>
          <CalibrationCard figures={odds.figures} count={odds.count} />
          <ScorePartsCard scores={scores} />
        </Row>
      )}
      <Row>
        <PlacesCard scores={scores} />
        <CoverageCard scores={scores} />
        <VolatilityCard scores={scores} />
      </Row>
      {scores.money.map((money) => (
        <Row key={money.currency}>
          <MoneyCard money={money} entries={scores.entries} />
          {money.figures?.sources == null ? null : <SourcesCard money={money} />}
        </Row>
      ))}
      <Row>
        <ProcessCard scores={scores} />
        <CutsCard scores={scores} filter={filter} onFilter={onFilter} />
      </Row>
      <ResolvedList scores={scores} />
    </>
  );
}

/** Cards beside one another where there is room. */
function Row({ children }: { children: ReactNode }) {
  const isWide = useLayout().kind === 'wide';
  if (!isWide) return <View style={{ gap: space.cardGap }}>{children}</View>;
  const cards = (Array.isArray(children) ? children : [children]).filter((card) => card !== null);
  return (
    <View style={{ flexDirection: 'row', gap: space.columnGap, alignItems: 'flex-start' }}>
      {cards.map((card, index) => (
        <View key={index} style={{ flex: 1, minWidth: 0 }}>
          {card}
        </View>
      ))}
    </View>
  );
}
