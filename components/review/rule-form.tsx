import { useState } from 'react';
import { View } from 'react-native';
import { uuidv7 } from 'uuidv7';
import { actionWords, followedWords } from '@/components/review/rule-words';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { Segmented } from '@/components/ui/segmented';
import { Txt } from '@/components/ui/text';
import { useToast } from '@/components/ui/toast';
import { useCreateWeeklyReview, useEditWeeklyReview } from '@/hooks/reviews/use-weekly-review';
import {
  type ReviewedWeek,
  type RuleAction,
  ruleActions,
  type RuleFollowing,
  ruleFollowings,
} from '@/shared/reviews/weekly-review-endpoints';

/** Writes the rule of a week. What is typed stays until it is stored. */
export function RuleForm({ view, onDone }: { view: ReviewedWeek; onDone: () => void }) {
  const { review, lastRule, week } = view;
  const toast = useToast();
  const [action, setAction] = useState<RuleAction>(review?.action ?? 'keep');
  const [rule, setRule] = useState(review?.rule ?? '');
  const [evidence, setEvidence] = useState(review?.evidence ?? '');
  const [followed, setFollowed] = useState<RuleFollowing | null>(review?.followedLast ?? null);
  // The same id until it is stored: a second press or a lost answer never makes two.
  const [reviewId] = useState(uuidv7);
  const create = useCreateWeeklyReview();
  const edit = useEditWeeklyReview();
  const { error, isPending } = review === null ? create : edit;
  const submit = () => {
    const written = { action, rule, evidence, followedLast: lastRule === null ? null : followed };
    const done = {
      onSuccess: () => {
        toast.show({ text: 'The rule is kept. Next week asks whether you followed it.' });
        onDone();
      },
    };
    if (review === null) create.mutate({ body: { id: reviewId, week: week.startSessionDate, ...written } }, done);
    else edit.mutate({ params: { reviewId: review.id }, version: review.version, body: written }, done);
  };
  const general = error === null || error.problems.length > 0 ? null : error;
  return (
    <View style={{ gap: 12 }}>
      {general === null ? null : (
        <Txt size="row" colour="rust" role="alert">
          {`${general.message} ${general.action} Your text is still here.`}
        </Txt>
      )}
      {lastRule === null ? null : (
        <Segmented
          label="Did you follow it?"
          options={ruleFollowings.map((value) => ({ value, label: followedWords[value] }))}
          value={followed ?? ''}
          onChange={(value) => {
            if (value !== '') setFollowed(value);
          }}
        />
      )}
      <Segmented
        label="One rule to"
        options={ruleActions.map((value) => ({ value, label: actionWords[value] }))}
        value={action}
        onChange={setAction}
      />
      <TextField
        label="The rule"
        hint="If … then …, so that next week can tell whether you followed it."
        value={rule}
        onChangeText={setRule}
        error={error?.problemOf('rule')}
        multiline
        lines={2}
      />
      <TextField
        label="Evidence"
        hint="Which entries of this week speak for it, and which against."
        value={evidence}
        onChangeText={setEvidence}
        error={error?.problemOf('evidence')}
        multiline
        lines={3}
      />
      <View style={{ flexDirection: 'row', gap: 8 }}>
        <Button
          kind="primary"
          label="Save rule"
          busy={isPending}
          busyLabel="Saving …"
          disabled={rule.trim() === '' || evidence.trim() === ''}
          onPress={submit}
        />
        {review === null ? null : <Button kind="secondary" label="Cancel" onPress={onDone} />}
      </View>
    </View>
  );
}
