import { useRouter, type Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { SessionsAhead } from '@/components/charts/sessions-ahead';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { EntrySheet } from '@/components/journal/entry-sheet';
import { TaskRow } from '@/components/today/task-row';
import { sessionsAhead } from '@/components/today/sessions-ahead-rows';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { CautionLine } from '@/components/ui/caution-line';
import { LabelledSection } from '@/components/ui/labelled-section';
import { formatDate } from '@/components/ui/number-format';
import { EmptyState } from '@/components/ui/states';
import { Txt } from '@/components/ui/text';
import { radius, space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useLayout } from '@/components/ui/use-layout';
import { useKeepsJournal } from '@/hooks/account/use-me';
import { useToday } from '@/hooks/today/use-today';
import { type Today, type TodayTask } from '@/shared/today/today-endpoints';

const groups: readonly (readonly [TodayTask['group'], string])[] = [
  ['before-next-open', 'Before the next open'],
  ['from-today', 'From today'],
  ['when-ready', 'When you are ready'],
];

/** What needs a person now, in the order it must be done, and what is running. */
export function TodayScreen() {
  const router = useRouter();
  const keepsJournal = useKeepsJournal();
  const isPhone = useLayout().kind === 'phone';
  const { data: today, error, isPending, refetch } = useToday();
  if (isPending || error)
    return <UnreadyScreen title="Today" loading="Loading today" error={error} onRetry={refetch} />;
  return (
    <ScreenFrame
      title="Today"
      note={isPhone ? shortSessionWords(today) : sessionWords(today)}
      action={
        keepsJournal ? (
          <Button kind="primary" icon="plus" label="Plan a trade" onPress={() => router.push('/plan/new')} />
        ) : undefined
      }
    >
      <TodayBody today={today} />
    </ScreenFrame>
  );
}

function TodayBody({ today }: { today: Today }) {
  const isWide = useLayout().kind === 'wide';
  const keepsJournal = useKeepsJournal();
  return (
    <View style={isWide ? { flexDirection: 'row', gap: space.gutterWide, alignItems: 'flex-start' } : { gap: 20 }}>
      <View style={[{ gap: 20, minWidth: 0 }, isWide ? { flex: 2 } : null]}>
        {groups.map(([group, label]) => (
          <TaskGroup key={group} label={label} tasks={today.tasks.filter((task) => task.group === group)} />
        ))}
        {today.tasks.length === 0 ? (
          <EmptyState
            title={keepsJournal ? 'Nothing waits for you' : 'Nothing asks for review'}
            text={
              keepsJournal
                ? 'Every plan is sealed, every closed trade has its lesson. Plan the next one when you have an idea.'
                : 'Sealed entries of the traders you mentor are in the journal.'
            }
          />
        ) : null}
      </View>
      <View style={[{ gap: 20, minWidth: 0 }, isWide ? { flex: 1 } : null]}>
        <LabelledSection label="Next sessions">
          <Card>
            <SessionsAhead sessions={sessionsAhead(today)} />
          </Card>
        </LabelledSection>
        <Running today={today} />
        <LabelledSection label="How your odds are doing" count={`${today.resolvedOddsCount} resolved`}>
          <Card>
            <Txt serif size="head">
              {today.meanBrierScore === null ? 'Too few to say' : `Mean Brier score ${today.meanBrierScore.toFixed(3)}`}
            </Txt>
            <Txt size="row" colour="inkSoft">
              {today.meanBrierScore === null
                ? 'From 20 resolved odds on there is a score; until then Scores lists them.'
                : '0 is perfect; always saying 50% scores 0.250.'}
            </Txt>
            <View style={{ flexDirection: 'row' }}>
              <Button kind="text" label="See scores" trailingIcon="chevron-right" href="/scores" />
              <View style={{ width: 24 }} />
              <Button kind="text" label="Weekly review" trailingIcon="chevron-right" href="/review" />
            </View>
          </Card>
        </LabelledSection>
        <CautionLine />
      </View>
    </View>
  );
}

/** So many lines of one group are read at a glance; the rest waits behind a button. */
const MOST_TASKS = 6;

function TaskGroup({ label, tasks }: { label: string; tasks: readonly TodayTask[] }) {
  const colours = useColours();
  const [showsAll, setShowsAll] = useState(false);
  if (tasks.length === 0) return null;
  const shown = showsAll || tasks.length <= MOST_TASKS + 1 ? tasks : tasks.slice(0, MOST_TASKS);
  return (
    <LabelledSection label={label} count={String(tasks.length)}>
      <View
        role="list"
        style={{
          backgroundColor: colours.sheet,
          borderColor: colours.rule,
          borderWidth: 1,
          borderRadius: radius.card,
          overflow: 'hidden',
        }}
      >
        {shown.map((task, index) => (
          <TaskRow key={`${task.title} ${index}`} task={task} isFirst={index === 0} href={hrefOf(task)} />
        ))}
      </View>
      {shown.length < tasks.length ? (
        <View style={{ flexDirection: 'row' }}>
          <Button
            kind="secondary"
            label={`Show ${tasks.length - shown.length} more`}
            onPress={() => setShowsAll(true)}
          />
        </View>
      ) : null}
    </LabelledSection>
  );
}

function Running({ today }: { today: Today }) {
  if (today.running.length === 0) return null;
  return (
    <LabelledSection label="Open and sealed" count={`${today.running.length} of ${today.runningCount}`}>
      <EntrySheet entries={today.running} />
    </LabelledSection>
  );
}

function hrefOf({ target, kind }: TodayTask): Href {
  switch (target.kind) {
    case 'entry':
      return kind === 'seal-draft'
        ? { pathname: '/plan/[entryId]', params: { entryId: target.entryId } }
        : { pathname: '/journal/[entryId]', params: { entryId: target.entryId, section: target.section } };
    case 'underlying':
      return target.sessionDate === null
        ? { pathname: '/prices/[underlyingId]/upload', params: { underlyingId: target.underlyingId } }
        : {
            pathname: '/prices/[underlyingId]',
            params: { underlyingId: target.underlyingId, session: target.sessionDate },
          };
    case 'weekly-review':
      return '/review';
    case 'new-underlying':
      return '/prices/new';
    case 'new-plan':
      return '/plan/new';
  }
}

function sessionWords({ session, nextSession }: Today): string {
  const day = formatDate(session.sessionDate, 'full');
  const next = `next session ${formatDate(nextSession.sessionDate, 'weekday')}, ${nextSession.kind === 'early' ? 'early close' : 'full'}`;
  return session.isOver ? `After the close of ${day} · ${next}` : `${day}, the session is open · ${next}`;
}

/** One line beside the button of a phone's top bar; the next sessions stand further down. */
function shortSessionWords({ session }: Today): string {
  const day = formatDate(session.sessionDate, 'weekday');
  return session.isOver ? `${day}, after the close` : `${day}, session open`;
}
