import { fireEvent, screen, within } from '@testing-library/react';
import { UploadPreview } from '@/components/prices/upload-preview';
import { renderScreen } from '@/tests/components/support/render-screen';
import { ids } from '@/tests/components/support/sample-journal';
import { type PriceUpload } from '@/shared/prices/price-upload';

const upload = (changes: Partial<PriceUpload> = {}): PriceUpload => ({
  id: ids.upload,
  underlyingId: ids.underlying,
  fileName: 'closes.csv',
  state: 'preview',
  sheets: [],
  headers: [
    { text: 'Date', samples: ['2026-12-08'] },
    { text: 'Close', samples: ['100.10'] },
  ],
  reading: {
    sheet: null,
    headerRow: 1,
    columns: ['date', 'close'],
    dateOrder: 'year-month-day',
    decimalMark: 'point',
  },
  questions: [],
  rowsRead: 12,
  added: 11,
  unchanged: 0,
  changes: [],
  refused: [],
  suspects: [],
  firstSessionDate: '2026-11-23',
  lastSessionDate: '2026-12-08',
  sample: [],
  canCommit: true,
  ...changes,
});

async function show(preview: PriceUpload) {
  const { calls } = renderScreen(<UploadPreview uploadId={ids.upload} symbol="ZZIX" onDone={() => undefined} />, {
    [`GET /price-uploads/${ids.upload}`]: preview,
    [`POST /price-uploads/${ids.upload}/commit`]: { ...preview, state: 'committed' },
  });
  const button = await screen.findByRole('button', { name: 'Store 11 bars' });
  return { calls, button };
}

const refused = { row: 14, text: '31/02/2026', column: 'Date', message: 'The date 31/02/2026 does not exist.' };

describe('the preview of an upload', () => {
  it('names each refused row with its reason, and holds Store', async () => {
    const { calls, button } = await show(upload({ refused: [refused], canCommit: false }));
    const table = screen.getByRole('table', { name: 'Rows that cannot be read' });
    const row = within(table).getByRole('row', { name: /31\/02\/2026/ });
    expect(within(row).getByRole('rowheader').textContent).toBe('14');
    expect(within(row).getByText('The date 31/02/2026 does not exist.')).toBeTruthy();
    expect(screen.getByText('Correct the file and choose it again; nothing was stored.')).toBeTruthy();
    fireEvent.click(button);
    expect(calls.filter((call) => call.startsWith('POST'))).toEqual([]);
  });

  it('stores a clean file when asked', async () => {
    const { calls, button } = await show(upload());
    fireEvent.click(button);
    await screen.findByText('11 new, 0 changed, 0 as before.');
    expect(calls).toContain(`POST /price-uploads/${ids.upload}/commit`);
  });
});
