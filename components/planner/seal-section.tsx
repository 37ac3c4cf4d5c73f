import { View } from 'react-native';
import { useFormContext, useWatch } from 'react-hook-form';
import { PlanField } from '@/components/planner/plan-field';
import { usePlan } from '@/components/planner/plan-form';
import { Card } from '@/components/ui/card';
import { Icon } from '@/components/ui/icon';
import { TagsField } from '@/components/ui/tags-field';
import { Txt } from '@/components/ui/text';
import { type DraftPlan } from '@/shared/entries/draft-plan';

/** The idea in words and its tags. */
export function IdeaSection() {
  const { setValue } = useFormContext<DraftPlan>();
  const tags = useWatch<DraftPlan, 'tags'>({ name: 'tags' });
  return (
    <Card title="Idea" subtitle="In your own words, for you in three months">
      <View style={{ gap: 12 }}>
        <PlanField name="idea" label="Why this trade, and what would prove you wrong" multiline />
        <TagsField label="Tags" value={tags} onChange={(next) => setValue('tags', [...next], { shouldDirty: true })} />
      </View>
    </Card>
  );
}

/** What sealing freezes, and what is still missing. */
export function SealSection() {
  const { preview } = usePlan();
  return (
    <Card title="Seal" subtitle="Nobody, you included, can change it later">
      {preview.kind === 'ready' ? (
        <View style={{ gap: 8 }}>
          <Check text={`${preview.forecast.odds.length} stated odds, each with its interval`} />
          <Check text="Prices, volatility, drift, legs, exits and fees as they stand" />
          <Check text={`Every output, recomputed by the server with engine ${preview.forecast.engineVersion}`} />
          <Check text="Time and hash, chained to your seal before" />
        </View>
      ) : (
        <View role="list" aria-label="What the plan still lacks" style={{ gap: 8 }}>
          {preview.problems.map((problem) => (
            <View key={`${problem.field} ${problem.message}`} role="listitem" style={{ flexDirection: 'row', gap: 8 }}>
              <Icon name="warning" size={16} colour="amber" />
              <Txt size="row" style={{ flex: 1 }}>
                {problem.message}
              </Txt>
            </View>
          ))}
        </View>
      )}
    </Card>
  );
}

function Check({ text }: { text: string }) {
  return (
    <View style={{ flexDirection: 'row', gap: 8 }}>
      <Icon name="check" size={16} colour="leaf" />
      <Txt size="row" style={{ flex: 1 }}>
        {text}
      </Txt>
    </View>
  );
}
