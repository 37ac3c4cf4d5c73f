import { useRef, useState, type ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { AssumptionsSection, ExitsSection } from '@/components/planner/exits-section';
import { HoldSection, MoveSection } from '@/components/planner/move-section';
import { LatticeSection, OddsSection, ProfitSection } from '@/components/planner/odds-section';
import { planFigures } from '@/components/planner/plan-figures';
import { usePlan } from '@/components/planner/plan-form';
import { IdeaSection, SealSection } from '@/components/planner/seal-section';
import { StructureSection } from '@/components/planner/structure-section';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/states';
import { ResultBar } from '@/components/ui/result-bar';
import { StepBar } from '@/components/ui/step-bar';
import { space } from '@/components/ui/theme/metrics';
import { systemClock } from '@/hooks/client/clock';

const steps = ['Move', 'Structure', 'Odds', 'Exits', 'Seal'] as const;
const LAST = steps.length - 1;

interface Props {
  readonly seal: ReactNode;
  /** Going on from a step: from now on its problems are shown. */
  readonly onLeaveStep: () => void;
}

/** The planner on a phone: five steps, any reached one can be reopened, the running result always in sight. */
export function PlannerSteps({ seal, onLeaveStep }: Props) {
  const { preview, detail } = usePlan();
  const [current, setCurrent] = useState(0);
  const scroll = useRef<ScrollView>(null);

  const go = (step: number) => {
    if (step > current + 1 || current >= 1) onLeaveStep();
    setCurrent(step);
    scroll.current?.scrollTo({ y: 0, animated: false });
  };
  const next = steps[current + 1];
  return (
    <View style={{ flex: 1 }}>
      <StepBar steps={steps} current={current} reached={LAST} onGo={go} />
      <ScrollView
        ref={scroll}
        style={{ flex: 1 }}
        contentContainerStyle={{ gap: space.cardGap, paddingVertical: space.cardGap }}
      >
        <StepContent step={current} />
      </ScrollView>
      <ResultBar
        figures={planFigures(preview, detail.underlying.currency).slice(0, 3)}
        actions={
          <View style={{ flexDirection: 'row', gap: 8 }}>
            {current > 0 ? <Button kind="secondary" size="main" label="Back" onPress={() => go(current - 1)} /> : null}
            <View style={{ flex: 1 }}>
              {next === undefined ? (
                seal
              ) : (
                <Button
                  kind="primary"
                  size="main"
                  label={`Next: ${next.toLowerCase()}`}
                  onPress={() => go(current + 1)}
                  fullWidth
                />
              )}
            </View>
          </View>
        }
      />
    </View>
  );
}

function StepContent({ step }: { step: number }) {
  switch (step) {
    case 0:
      return (
        <>
          <MoveSection />
          <HoldSection />
          <AssumptionsSection clock={systemClock} />
        </>
      );
    case 1:
      return <StructureSection />;
    case 2:
      return <OddsStep />;
    case 3:
      return <ExitsSection />;
    default:
      return (
        <>
          <IdeaSection />
          <SealSection />
        </>
      );
  }
}

function OddsStep() {
  const { preview } = usePlan();
  if (preview.kind === 'incomplete') {
    const [first] = preview.problems;
    return <EmptyState title="No odds yet" text={first?.message ?? 'Complete the plan first.'} />;
  }
  return (
    <>
      <OddsSection />
      <ProfitSection />
      <LatticeSection />
    </>
  );
}
