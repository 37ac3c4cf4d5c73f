import * as DocumentPicker from 'expo-document-picker';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { UploadPreview } from '@/components/prices/upload-preview';
import { Banner } from '@/components/ui/banner';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';
import { useUploadPrices } from '@/hooks/prices/use-price-upload';
import { useUnderlying } from '@/hooks/underlyings/use-underlyings';
import { priceFileLimits } from '@/shared/prices/price-upload-endpoints';

const kinds = [
  'text/csv',
  'text/plain',
  'text/tab-separated-values',
  'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
  '.csv',
  '.tsv',
  '.txt',
  '.xlsx',
];

/** A file of daily bars: choose it, see what it would change, store all of it or nothing. */
export function UploadScreen({ underlyingId }: { underlyingId: string }) {
  const router = useRouter();
  const upload = useUploadPrices();
  const { data: detail, error, isPending, refetch } = useUnderlying(underlyingId);
  const [uploadId, setUploadId] = useState<string | null>(null);
  const [tooLarge, setTooLarge] = useState<string | null>(null);
  if (isPending || error)
    return <UnreadyScreen title="Upload" loading="Loading underlying" error={error} onRetry={refetch} />;
  const { symbol } = detail.underlying;
  const back = () => router.navigate({ pathname: '/prices/[underlyingId]', params: { underlyingId } });

  const choose = async () => {
    const picked = await DocumentPicker.getDocumentAsync({ type: kinds, multiple: false, copyToCacheDirectory: false });
    const file = picked.canceled ? undefined : picked.assets[0]?.file;
    if (file === undefined) return;
    // Said before sending: a server that refuses in the middle of a long upload can only cut the line.
    const isTooLarge = file.size > priceFileLimits.bytes;
    setTooLarge(isTooLarge ? file.name : null);
    if (isTooLarge) return;
    upload.mutate({ params: { underlyingId }, body: file }, { onSuccess: ({ id }) => setUploadId(id) });
  };
  return (
    <ScreenFrame title={`Upload bars of ${symbol}`} back={{ label: symbol, onPress: back }}>
      <View style={{ gap: space.cardGap }}>
        <Card
          title="The file"
          subtitle="CSV, TSV or XLSX with a header; a date and a close are enough, open, high and low are read too"
        >
          <View style={{ gap: 12 }}>
            <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 12, alignItems: 'center' }}>
              <Button
                kind={uploadId === null ? 'primary' : 'secondary'}
                icon="upload"
                label={uploadId === null ? 'Choose a file' : 'Choose another file'}
                busy={upload.isPending}
                busyLabel="Reading …"
                onPress={choose}
              />
              <Txt size="note" colour="inkSoft">
                Columns are found by their names, in any order. Up to 20 MB.
              </Txt>
            </View>
            {tooLarge === null ? null : (
              <Banner
                kind="rust"
                title={`${tooLarge} is larger than ${priceFileLimits.bytes / 1024 / 1024} MB.`}
                text="Save the prices alone as CSV, or split the file."
              />
            )}
            {upload.error === null || tooLarge !== null ? null : (
              <Banner
                kind="rust"
                title={upload.error.message}
                text={[...upload.error.problems.map(({ message }) => message), upload.error.action].join(' ')}
              />
            )}
          </View>
        </Card>
        {uploadId === null ? null : <UploadPreview uploadId={uploadId} symbol={symbol} onDone={back} />}
      </View>
    </ScreenFrame>
  );
}
