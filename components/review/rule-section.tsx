import { useState } from 'react';
import { View } from 'react-native';
import { RuleForm } from '@/components/review/rule-form';
import { actionWords, followedWords } from '@/components/review/rule-words';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { formatDate } from '@/components/ui/number-format';
import { Rule } from '@/components/ui/rule';
import { Txt } from '@/components/ui/text';
import { type ReviewedWeek, type WeeklyReview } from '@/shared/reviews/weekly-review-endpoints';

/** The one rule taken from a week, under the one before; to write while it is the reader's own and blank. */
export function RuleSection({ view }: { view: ReviewedWeek }) {
  const { review, lastRule, isOwn } = view;
  const [isEditing, setIsEditing] = useState(false);
  const isWriting = isOwn && (isEditing || review === null);
  return (
    <Card
      title="One rule"
      subtitle="To keep, to change or to drop, and what it rests on"
      action={
        isOwn && review !== null && !isEditing ? (
          <Button kind="text" icon="pencil" label="Edit" onPress={() => setIsEditing(true)} />
        ) : undefined
      }
    >
      <View style={{ gap: 16 }}>
        {lastRule === null ? null : (
          <>
            <Written
              review={lastRule}
              label={`The rule of the week from ${formatDate(lastRule.weekStartSessionDate, 'long')}`}
            />
            <Rule />
          </>
        )}
        {isWriting ? (
          <RuleForm view={view} onDone={() => setIsEditing(false)} />
        ) : review === null ? (
          <Txt size="row" colour="inkSoft">
            Not written yet.
          </Txt>
        ) : (
          <View style={{ gap: 12 }}>
            {review.followedLast === null ? null : (
              <Txt size="row">{`The rule before was followed: ${followedWords[review.followedLast].toLowerCase()}.`}</Txt>
            )}
            <Written review={review} label="The rule of this week" />
          </View>
        )}
      </View>
    </Card>
  );
}

function Written({ review, label }: { review: WeeklyReview; label: string }) {
  return (
    <View style={{ gap: 4, maxWidth: 620 }}>
      <Txt size="note" colour="inkSoft">
        {label}
      </Txt>
      <Txt size="body">
        <Txt size="body" weight="semibold">
          {`${actionWords[review.action]}: `}
        </Txt>
        {review.rule}
      </Txt>
      <Txt size="row" colour="inkSoft">
        {`Evidence: ${review.evidence}`}
      </Txt>
    </View>
  );
}
