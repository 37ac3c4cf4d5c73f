import { View } from 'react-native';
import { UploadQuestions } from '@/components/prices/upload-questions';
import { Banner } from '@/components/ui/banner';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { formatDate } from '@/components/ui/number-format';
import { ErrorState, LoadingState } from '@/components/ui/states';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';
import { useCommitPriceUpload, usePriceUpload } from '@/hooks/prices/use-price-upload';
import { type PriceUpload } from '@/shared/prices/price-upload';

interface Props {
  readonly uploadId: string;
  readonly symbol: string;
  readonly onDone: () => void;
}
const MOST_SHOWN = 50;

/** What a file would change: refused rows first, then questions, changes and a sample; stored only as a whole. */
export function UploadPreview({ uploadId, symbol, onDone }: Props) {
  const { data: upload, error, isPending, refetch } = usePriceUpload(uploadId);
  const commit = useCommitPriceUpload();
  if (isPending) return <LoadingState label="Loading preview" />;
  if (error) return <ErrorState error={error} onRetry={refetch} />;
  if (upload.state === 'committed') {
    return (
      <Card title="Stored">
        <View style={{ gap: 12 }}>
          <Banner
            kind="leaf"
            title={`${upload.added} new, ${upload.changes.length} changed, ${upload.unchanged} as before.`}
            text={`The bars of ${symbol} are up to date with this file.`}
          />
          <View style={{ flexDirection: 'row' }}>
            <Button label={`See ${symbol}`} onPress={onDone} />
          </View>
        </View>
      </Card>
    );
  }
  return (
    <View style={{ gap: space.cardGap }}>
      <UploadQuestions upload={upload} />
      <Refused upload={upload} />
      <Card title="What it would change" subtitle={`${upload.fileName}, ${upload.rowsRead} rows read`}>
        <View style={{ gap: 12 }}>
          <Totals upload={upload} />
          <Changes upload={upload} />
          <Sample upload={upload} />
          {commit.error === null ? null : (
            <Banner kind="rust" title={commit.error.message} text={commit.error.action} />
          )}
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 12, alignItems: 'center' }}>
            <Button
              size="main"
              label={
                upload.added + upload.changes.length === 0
                  ? 'Nothing to store'
                  : `Store ${upload.added + upload.changes.length} bars`
              }
              disabled={!upload.canCommit || upload.added + upload.changes.length === 0}
              busy={commit.isPending}
              busyLabel="Storing …"
              onPress={() => commit.mutate({ params: { uploadId } })}
            />
            {upload.canCommit ? null : (
              <Txt size="row" colour="inkSoft">
                {upload.questions.length > 0
                  ? 'Answer the question above first.'
                  : 'Correct the file and choose it again; nothing was stored.'}
              </Txt>
            )}
          </View>
        </View>
      </Card>
    </View>
  );
}

function Totals({ upload }: { upload: PriceUpload }) {
  const range =
    upload.firstSessionDate === null || upload.lastSessionDate === null
      ? ''
      : `${formatDate(upload.firstSessionDate, 'withYear')} to ${formatDate(upload.lastSessionDate, 'withYear')}`;
  return (
    <View style={{ gap: 8 }}>
      <Txt size="body">
        <Txt size="body" weight="semibold">{`${upload.added} new sessions`}</Txt>
        {`, ${upload.changes.length} changed, ${upload.unchanged} as before${range === '' ? '' : `; ${range}`}.`}
      </Txt>
      {upload.suspects.slice(0, 5).map(({ row, message }) => (
        <Banner key={row} kind="amber" title={`Row ${row}`} text={message} />
      ))}
    </View>
  );
}

function Refused({ upload }: { upload: PriceUpload }) {
  if (upload.refused.length === 0) return null;
  return (
    <Card
      title={`${upload.refused.length} ${upload.refused.length === 1 ? 'row' : 'rows'} cannot be read`}
      subtitle="The file is stored as a whole or not at all"
    >
      <DataTable
        caption="Rows that cannot be read"
        columns={[
          { key: 'row', header: 'Row', align: 'right', width: 56 },
          { key: 'text', header: 'In the file', flex: 1 },
          { key: 'message', header: 'Why, and what to do', flex: 2 },
        ]}
        rows={upload.refused.slice(0, MOST_SHOWN).map(({ row, text, message }, index) => ({
          key: `${row} ${index}`,
          cells: { row: String(row), text, message },
        }))}
      />
      {upload.refused.length > MOST_SHOWN ? (
        <Txt size="note" colour="inkSoft">{`and ${upload.refused.length - MOST_SHOWN} more`}</Txt>
      ) : null}
    </Card>
  );
}

function Changes({ upload }: { upload: PriceUpload }) {
  if (upload.changes.length === 0) return null;
  return (
    <DataTable
      caption="Closes that would change"
      columns={[
        { key: 'date', header: 'Changed close', flex: 2 },
        { key: 'from', header: 'Stored', align: 'right' },
        { key: 'to', header: 'In the file', align: 'right' },
      ]}
      rows={upload.changes.slice(0, MOST_SHOWN).map(({ sessionDate, from, to }) => ({
        key: sessionDate,
        cells: { date: formatDate(sessionDate, 'withYear'), from, to },
      }))}
    />
  );
}

function Sample({ upload }: { upload: PriceUpload }) {
  if (upload.sample.length === 0) return null;
  return (
    <DataTable
      caption="The first and last bars as they were read"
      columns={[
        { key: 'date', header: 'Session', flex: 2 },
        { key: 'open', header: 'Open', align: 'right' },
        { key: 'high', header: 'High', align: 'right' },
        { key: 'low', header: 'Low', align: 'right' },
        { key: 'close', header: 'Close', align: 'right' },
      ]}
      rows={upload.sample.map(({ row, sessionDate, open, high, low, close }) => ({
        key: String(row),
        cells: {
          date: formatDate(sessionDate, 'withYear'),
          open: open ?? '–',
          high: high ?? '–',
          low: low ?? '–',
          close,
        },
      }))}
    />
  );
}
