import { View } from 'react-native';
import { type ProcessMark, processMarks } from '@/components/entry/process-words';
import { anchorOf } from '@/components/entry/entry-sections';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Card } from '@/components/ui/card';
import { HiddenText } from '@/components/ui/hidden-text';
import { Icon } from '@/components/ui/icon';
import { Rule } from '@/components/ui/rule';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';
import { useMe } from '@/hooks/account/use-me';

/** How the plan was carried out, kept apart from what it brought. */
export function ProcessSection({ entry }: { entry: SealedEntry }) {
  const { data: me } = useMe();
  const process = entry.outcome?.process ?? null;
  if (process === null) {
    return (
      <Card anchor={anchorOf('process')} title="Process">
        <Txt size="row" colour="inkSoft">
          Told from the first fill on: seal, size, price and exit against the plan.
        </Txt>
      </Card>
    );
  }
  const marks = processMarks(process, entry, me?.person.timeZone ?? 'America/New_York');
  const kept = marks.filter(({ isKept }) => isKept === true).length;
  return (
    <Card
      anchor={anchorOf('process')}
      title="Process"
      subtitle={`${kept} of ${marks.length} kept, apart from the result`}
    >
      <View role="list" style={{ gap: 10 }}>
        {marks.map((mark, index) => (
          <View key={mark.title} role="listitem" style={{ gap: 10 }}>
            {index > 0 ? <Rule /> : null}
            <Mark {...mark} />
          </View>
        ))}
      </View>
    </Card>
  );
}

function Mark({ title, note, isKept }: ProcessMark) {
  const colours = useColours();
  const look =
    isKept === null
      ? { icon: 'clock' as const, ink: 'inkSoft' as const, ground: colours.well, word: 'not known yet' }
      : isKept
        ? { icon: 'check' as const, ink: 'leaf' as const, ground: colours.leafWash, word: 'kept' }
        : { icon: 'warning' as const, ink: 'amber' as const, ground: colours.amberWash, word: 'not kept' };
  return (
    <View style={{ flexDirection: 'row', gap: 12, alignItems: 'flex-start' }}>
      <View
        style={{
          width: 28,
          height: 28,
          borderRadius: 14,
          backgroundColor: look.ground,
          alignItems: 'center',
          justifyContent: 'center',
        }}
      >
        <Icon name={look.icon} size={16} colour={look.ink} />
      </View>
      <View style={{ flex: 1, minWidth: 0 }}>
        <Txt size="row" weight="medium">
          {title}
          <HiddenText>{`: ${look.word}`}</HiddenText>
        </Txt>
        <Txt size="note" colour="inkSoft">
          {note}
        </Txt>
      </View>
    </View>
  );
}
