import { type Href } from 'expo-router';
import { View } from 'react-native';
import { Icon } from '@/components/ui/icon';
import { type IconName } from '@/components/ui/icon-shapes';
import { LinkRow } from '@/components/ui/link-row';
import { formatMoney, withDatesInWords } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';
import { type TodayTask } from '@/shared/today/today-endpoints';

const icons: Record<TodayTask['kind'], IconName> = {
  expiring: 'exercise',
  'past-expiry': 'exercise',
  untraded: 'seal',
  'missing-prices': 'bars',
  'missing-settlement': 'bars',
  'weekly-review': 'checklist',
  'write-lesson': 'pencil',
  'seal-draft': 'seal',
  start: 'plus',
};

interface Props {
  readonly task: TodayTask;
  readonly isFirst: boolean;
  readonly href: Href;
}

/** One task: what, why in a sentence, and the verb; the whole line is one target. */
export function TaskRow({ task, isFirst, href }: Props) {
  const colours = useColours();
  const isUrgent = task.group === 'before-next-open';
  return (
    <View role="listitem" style={{ borderTopWidth: isFirst ? 0 : 1, borderColor: colours.rule }}>
      <LinkRow href={href} style={{ flexDirection: 'row', gap: 12, padding: 16 }}>
        <View
          style={{
            width: 36,
            height: 36,
            borderRadius: 18,
            alignItems: 'center',
            justifyContent: 'center',
            backgroundColor: isUrgent ? colours.amberWash : colours.well,
          }}
        >
          <Icon name={icons[task.kind]} size={18} colour={isUrgent ? 'amber' : 'inkSoft'} />
        </View>
        <View style={{ flex: 1, gap: 2 }}>
          <Txt size="body" weight="semibold">
            {withDatesInWords(task.title)}
          </Txt>
          <Txt size="row" colour="inkSoft">
            {task.profit === null
              ? withDatesInWords(task.why)
              : `${formatMoney(task.profit.realised, { sign: true, currency: task.profit.currency })}; ${withDatesInWords(task.why)}`}
          </Txt>
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: 4 }}>
            <Txt size="row" weight="semibold" colour="bramble">
              {task.action}
            </Txt>
            <Icon name="chevron-right" size={16} colour="bramble" />
          </View>
        </View>
      </LinkRow>
    </View>
  );
}
