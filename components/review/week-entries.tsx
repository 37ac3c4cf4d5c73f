import { EntrySheet } from '@/components/journal/entry-sheet';
import { Card } from '@/components/ui/card';
import { LabelledSection } from '@/components/ui/labelled-section';
import { Txt } from '@/components/ui/text';
import { type EntryRow } from '@/shared/entries/entry';

interface Props {
  readonly title: string;
  readonly entries: readonly EntryRow[];
  /** Said where there is none. */
  readonly empty: string;
}

/** The entries of a week of one kind. */
export function WeekEntries({ title, entries, empty }: Props) {
  return (
    <LabelledSection label={title} count={String(entries.length)}>
      {entries.length === 0 ? (
        <Card>
          <Txt size="row" colour="inkSoft">
            {empty}
          </Txt>
        </Card>
      ) : (
        <EntrySheet entries={entries} />
      )}
    </LabelledSection>
  );
}
