import { View } from 'react-native';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { whatChanged } from '@/components/entry/what-changed-words';
import { Card } from '@/components/ui/card';
import { Rule } from '@/components/ui/rule';
import { Txt } from '@/components/ui/text';

/** How the outcome changed after it was first known; nothing when it did not. */
export function WhatChangedSection({ entry }: { entry: SealedEntry }) {
  const changes = whatChanged(entry.history, entry.row.underlying.currency);
  if (changes.length === 0) return null;
  return (
    <Card
      title="What changed"
      subtitle="Late and corrected data, newest first, New York time. The seal stays as it is."
    >
      <View role="list" style={{ gap: 10 }}>
        {changes.map(({ key, cause, effects }, index) => (
          <View key={key} role="listitem" style={{ gap: 10 }}>
            {index > 0 ? <Rule /> : null}
            <View style={{ maxWidth: 620 }}>
              <Txt size="row" weight="medium">
                {`${cause}:`}
              </Txt>
              {effects.map((effect) => (
                <Txt key={effect} size="row" colour="inkSoft">
                  {effect}
                </Txt>
              ))}
            </View>
          </View>
        ))}
      </View>
    </Card>
  );
}
