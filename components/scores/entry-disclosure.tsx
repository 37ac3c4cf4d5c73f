import { useId, useState } from 'react';
import { View } from 'react-native';
import { EntryLink } from '@/components/scores/entry-link';
import { entriesWord } from '@/components/scores/score-words';
import { Button } from '@/components/ui/button';
import { formatDate } from '@/components/ui/number-format';
import { DataTable, type TableRow } from '@/components/ui/table';
import { type ListedEntry } from '@/shared/scores/scores';

const STEP = 50;

interface Props {
  /** What the entries are those of: "moves beyond 2σ". */
  readonly what: string;
  /** Of the newest that the page knows. */
  readonly entries: readonly ListedEntry[];
  /** The figure of one entry, with its head. */
  readonly header: string;
  readonly figureOf: (entry: ListedEntry) => TableRow['cells'][string];
}

/** The entries behind a figure, opened under it. */
export function EntryDisclosure({ what, entries, header, figureOf }: Props) {
  const [isOpen, setIsOpen] = useState(false);
  const [shown, setShown] = useState(STEP);
  const id = useId();
  if (entries.length === 0) return null;
  return (
    <View style={{ gap: 4 }}>
      <View style={{ alignItems: 'flex-start' }}>
        <Button
          kind="text"
          icon="bars"
          label={isOpen ? `Hide ${what}` : `Show ${entriesWord(entries.length)}: ${what}`}
          aria-expanded={isOpen}
          aria-controls={id}
          onPress={() => setIsOpen(!isOpen)}
        />
      </View>
      <View id={id} style={{ gap: 8 }}>
        {isOpen ? (
          <DataTable
            caption={`Entries: ${what}`}
            columns={[
              { key: 'entry', header: 'Entry', flex: 3 },
              { key: 'exit', header: 'Exit', align: 'right', flex: 1.4 },
              { key: 'figure', header, align: 'right', flex: 1.4 },
            ]}
            rows={entries.slice(0, shown).map((entry) => ({
              key: entry.entryId,
              cells: {
                entry: <EntryLink entryId={entry.entryId} text={`${entry.symbol} ${entry.structureName}`} />,
                exit: formatDate(entry.exitSessionDate),
                figure: figureOf(entry),
              },
            }))}
          />
        ) : null}
        {isOpen && entries.length > shown ? (
          <View style={{ flexDirection: 'row' }}>
            <Button
              kind="secondary"
              label={`Show ${Math.min(STEP, entries.length - shown)} more`}
              onPress={() => setShown(shown + STEP)}
            />
          </View>
        ) : null}
      </View>
    </View>
  );
}
