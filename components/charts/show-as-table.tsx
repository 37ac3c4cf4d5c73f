import { useId, useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { DataTable, type TableColumn, type TableRow } from '@/components/ui/table';

interface Props {
  /** What the table shows, named on the button for screen readers and as the table's caption. */
  readonly caption: string;
  readonly columns: readonly TableColumn[];
  readonly rows: readonly TableRow[];
}

/** The numbers behind a graphic, opened under it. */
export function ShowAsTable({ caption, columns, rows }: Props) {
  const [isOpen, setIsOpen] = useState(false);
  const tableId = useId();
  return (
    <View style={{ gap: 4, alignItems: 'stretch' }}>
      <View style={{ alignItems: 'flex-start' }}>
        <Button
          kind="text"
          icon="bars"
          label={isOpen ? 'Hide table' : 'Show as table'}
          accessibilityHint={caption}
          aria-expanded={isOpen}
          aria-controls={tableId}
          onPress={() => setIsOpen(!isOpen)}
        />
      </View>
      <View id={tableId}>{isOpen ? <DataTable caption={caption} columns={columns} rows={rows} /> : null}</View>
    </View>
  );
}
