import { View } from 'react-native';
import { pageText } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';
import { linkTo } from '@/hooks/client/api-client';
import { exportEndpoints, type ExportQuery, exportTableNames } from '@/shared/exports/export-endpoints';

type Filter = Pick<ExportQuery, 'state' | 'underlyingId' | 'tag' | 'search'>;

/** Links that save the journal as files: all of it, or what fits a filter. */
export function FileLinks({ filter = {} }: { filter?: Filter }) {
  const link = (query: Partial<ExportQuery>) =>
    linkTo(exportEndpoints.exportJournal, { query: { ...filter, ...query } });
  return (
    <View role="list" style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 16, rowGap: 4 }}>
      <FileLink href={link({ format: 'xlsx' })} text="Workbook, every table" />
      <FileLink href={link({ format: 'json' })} text="JSON, every table" />
      {exportTableNames.map((table) => (
        <FileLink key={table} href={link({ format: 'csv', table })} text={`CSV, ${table}`} />
      ))}
    </View>
  );
}

function FileLink({ href, text }: { href: string; text: string }) {
  const colours = useColours();
  return (
    <View role="listitem">
      <a
        href={href}
        download
        style={{
          ...pageText('row', 'medium'),
          color: colours.bramble,
          textDecoration: 'underline',
          paddingTop: 8,
          paddingBottom: 8,
          display: 'inline-block',
        }}
      >
        {text}
      </a>
    </View>
  );
}
