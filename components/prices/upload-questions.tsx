import { useState } from 'react';
import { View } from 'react-native';
import { Banner } from '@/components/ui/banner';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { SelectField } from '@/components/ui/select-field';
import { Txt } from '@/components/ui/text';
import { useRereadPriceUpload } from '@/hooks/prices/use-price-upload';
import {
  barColumns,
  readingSchema,
  type PriceUpload,
  type Reading,
  type ReadingQuestion,
} from '@/shared/prices/price-upload';

const columnLabels: Record<(typeof barColumns)[number], string> = {
  date: 'Date',
  open: 'Open',
  high: 'High',
  low: 'Low',
  close: 'Close',
  ignore: 'Leave out',
};

/** What a file leaves open, asked with an example from it; and how it was read, to be changed. */
export function UploadQuestions({ upload }: { upload: PriceUpload }) {
  const reread = useRereadPriceUpload();
  const apply = (reading: Reading) => reread.mutate({ params: { uploadId: upload.id }, body: reading });
  const [showsColumns, setShowsColumns] = useState(false);
  const asksColumns = upload.questions.some(({ about }) => about === 'columns');
  return (
    <View style={{ gap: 12 }}>
      {reread.error === null ? null : <Banner kind="rust" title={reread.error.message} text={reread.error.action} />}
      {upload.questions
        .filter(({ about }) => about !== 'columns')
        .map((question) => (
          <Card key={question.about} title={question.question}>
            <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
              {question.choices.map((choice) => (
                <Button
                  key={choice.value}
                  kind="secondary"
                  label={choice.example === '' ? choice.label : `${choice.label}: ${choice.example}`}
                  disabled={reread.isPending}
                  onPress={() => answer(question, choice.value, upload.reading, apply)}
                />
              ))}
            </View>
          </Card>
        ))}
      {asksColumns || showsColumns ? (
        <ColumnsCard
          upload={upload}
          onApply={apply}
          isBusy={reread.isPending}
          question={upload.questions.find(({ about }) => about === 'columns')}
        />
      ) : (
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12, flexWrap: 'wrap' }}>
          <Txt size="row" colour="inkSoft">
            {readingWords(upload)}
          </Txt>
          <Button kind="text" label="Change columns" onPress={() => setShowsColumns(true)} />
        </View>
      )}
    </View>
  );
}

function answer({ about }: ReadingQuestion, value: string, reading: Reading, apply: (reading: Reading) => void): void {
  const next = readingSchema.safeParse({ ...reading, [about]: value });
  if (next.success) apply(next.data);
}

function readingWords({ headers, reading }: PriceUpload): string {
  const used = headers.flatMap(({ text }, index) => {
    const meaning = reading.columns[index];
    return meaning === undefined || meaning === 'ignore'
      ? []
      : [`${columnLabels[meaning].toLowerCase()} from “${text}”`];
  });
  return `Read as: ${used.join(', ')}.`;
}

interface ColumnsProps {
  readonly upload: PriceUpload;
  readonly question: ReadingQuestion | undefined;
  readonly isBusy: boolean;
  readonly onApply: (reading: Reading) => void;
}

function ColumnsCard({ upload, question, isBusy, onApply }: ColumnsProps) {
  const [columns, setColumns] = useState(upload.reading.columns);
  return (
    <Card title={question?.question ?? 'What the columns mean'}>
      <View style={{ gap: 12 }}>
        {upload.headers.map(({ text, samples }, index) => (
          <SelectField
            key={`${index} ${text}`}
            label={text === '' ? `Column ${index + 1}` : text}
            hint={samples.slice(0, 3).join(', ')}
            value={columns[index] ?? 'ignore'}
            options={barColumns.map((value) => ({ value, label: columnLabels[value] }))}
            onChange={(meaning) => setColumns(columns.map((known, at) => (at === index ? meaning : known)))}
          />
        ))}
        <View style={{ flexDirection: 'row' }}>
          <Button
            label="Read it so"
            busy={isBusy}
            busyLabel="Reading …"
            onPress={() => onApply({ ...upload.reading, columns })}
          />
        </View>
      </View>
    </Card>
  );
}
