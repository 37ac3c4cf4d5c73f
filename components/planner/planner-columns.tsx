import { type ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { AssumptionsSection, ExitsSection } from '@/components/planner/exits-section';
import { HoldSection, MoveSection } from '@/components/planner/move-section';
import { LatticeSection, OddsSection, ProfitSection } from '@/components/planner/odds-section';
import { planFigures } from '@/components/planner/plan-figures';
import { usePlan } from '@/components/planner/plan-form';
import { IdeaSection, SealSection } from '@/components/planner/seal-section';
import { StructureSection } from '@/components/planner/structure-section';
import { CautionLine } from '@/components/ui/caution-line';
import { Card } from '@/components/ui/card';
import { ResultBar } from '@/components/ui/result-bar';
import { Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';
import { systemClock } from '@/hooks/client/clock';

/** The planner on a wide screen: move and structure, odds and profit, lattice and exits at once. */
export function PlannerColumns({ seal }: { seal: ReactNode }) {
  const { preview, detail } = usePlan();
  return (
    <View style={{ flex: 1 }}>
      <ScrollView style={{ flex: 1 }} contentContainerStyle={{ paddingBottom: space.gutterWide }}>
        <View style={{ flexDirection: 'row', gap: space.columnGap, alignItems: 'flex-start' }}>
          <Column flex={380}>
            <MoveSection />
            <HoldSection />
            <StructureSection />
          </Column>
          <Column flex={404}>
            {preview.kind === 'ready' ? (
              <>
                <OddsSection />
                <ProfitSection />
              </>
            ) : (
              <Card title="Odds">
                <Txt size="row" colour="inkSoft">
                  {preview.problems[0]?.message ?? 'Complete the plan to see its odds.'}
                </Txt>
              </Card>
            )}
            <IdeaSection />
            <SealSection />
          </Column>
          <Column flex={480}>
            <LatticeSection />
            <ExitsSection />
            <AssumptionsSection clock={systemClock} />
          </Column>
        </View>
      </ScrollView>
      <ResultBar
        figures={planFigures(preview, detail.underlying.currency)}
        actions={
          <View style={{ flexDirection: 'row', gap: 24, alignItems: 'center' }}>
            <CautionLine />
            <View style={{ width: 176 }}>{seal}</View>
          </View>
        }
      />
    </View>
  );
}

function Column({ flex, children }: { flex: number; children: ReactNode }) {
  return (
    <View style={{ flexGrow: flex, flexShrink: 1, flexBasis: 0, minWidth: 0, gap: space.cardGap }}>{children}</View>
  );
}
