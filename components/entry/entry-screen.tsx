import { useRouter } from 'expo-router';
import { useEffect, type ReactNode } from 'react';
import { View } from 'react-native';
import { EntryHead } from '@/components/entry/entry-head';
import { anchorOf, entrySections, type EntrySection } from '@/components/entry/entry-sections';
import { ExpectedBesideRealised } from '@/components/entry/expected-beside-realised';
import { FillsSection } from '@/components/entry/fills-section';
import { LandingSection } from '@/components/entry/landing-section';
import { LessonSection } from '@/components/entry/lesson-section';
import { OddsOutcomeSection } from '@/components/entry/odds-outcome-section';
import { ProcessSection } from '@/components/entry/process-section';
import { ProfitSourceSection } from '@/components/entry/profit-source-section';
import { SealedPlanSection } from '@/components/entry/sealed-plan-section';
import { WaitsSection } from '@/components/entry/waits-section';
import { WhatChangedSection } from '@/components/entry/what-changed-section';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { CautionLine } from '@/components/ui/caution-line';
import { PrintButton } from '@/components/ui/print-button';
import { focusHeading, SectionLinks } from '@/components/ui/section-links';
import { EmptyState } from '@/components/ui/states';
import { space } from '@/components/ui/theme/metrics';
import { useLayout } from '@/components/ui/use-layout';
import { useEntry } from '@/hooks/entries/use-entries';

/** One entry after its seal: where it landed, the odds and what happened, fills, lesson, and the sealed plan. */
export function EntryScreen({ entryId, section }: { entryId: string; section?: EntrySection }) {
  const router = useRouter();
  const { kind: layout } = useLayout();
  const { data: entry, error, isPending, refetch } = useEntry(entryId);
  const back = layout === 'wide' ? undefined : { label: 'Journal', onPress: () => router.navigate('/journal') };
  useFirstSection(section, !isPending && error === null);
  if (isPending || error)
    return <UnreadyScreen title="Entry" back={back} loading="Loading entry" error={error} onRetry={refetch} />;

  const title = `${entry.row.underlying.symbol} ${entry.row.structureName}`;
  const { sealed } = entry;
  if (sealed === null) {
    const open = () => router.push({ pathname: '/plan/[entryId]', params: { entryId } });
    return (
      <ScreenFrame title={title} back={back}>
        <EmptyState
          title="Still a draft"
          text="Nothing is sealed yet."
          action={entry.isOwn ? { label: 'Go on planning', onPress: open } : undefined}
        />
      </ScreenFrame>
    );
  }
  const sealedEntry = { ...entry, sealed };
  return (
    <ScreenFrame
      title={title}
      back={back}
      head={<EntryHead entry={sealedEntry} />}
      sections={<SectionLinks label="Sections of this entry" sections={links} />}
      action={<PrintButton />}
    >
      <View style={{ gap: space.cardGap }}>
        <WaitsSection entry={sealedEntry} />
        <LandingSection entry={sealedEntry} />
        <Pair>
          <OddsOutcomeSection entry={sealedEntry} />
          <ExpectedBesideRealised entry={sealedEntry} />
        </Pair>
        <WhatChangedSection entry={sealedEntry} />
        <Pair>
          <ProfitSourceSection entry={sealedEntry} />
          <ProcessSection entry={sealedEntry} />
        </Pair>
        <FillsSection entry={sealedEntry} />
        <LessonSection entry={sealedEntry} startsWriting={section === 'lesson'} />
        <SealedPlanSection entry={sealedEntry} />
        <CautionLine />
      </View>
    </ScreenFrame>
  );
}

const links = entrySections.map(({ key, label }) => ({ anchor: anchorOf(key), label }));

/** Brings the reader to the section the address names, once it is there. */
function useFirstSection(section: EntrySection | undefined, isThere: boolean): void {
  useEffect(() => {
    if (isThere && section !== undefined) focusHeading(anchorOf(section));
  }, [section, isThere]);
}

/** Two cards side by side where there is room. */
function Pair({ children }: { children: readonly [ReactNode, ReactNode] }) {
  const isWide = useLayout().kind === 'wide';
  return (
    <View
      style={isWide ? { flexDirection: 'row', gap: space.columnGap, alignItems: 'flex-start' } : { gap: space.cardGap }}
    >
      {children.map((child, index) => (
        <View key={index} style={isWide ? { flex: 1, minWidth: 0 } : undefined}>
          {child}
        </View>
      ))}
    </View>
  );
}
