import { readFile } from 'node:fs/promises';
import { isDeepStrictEqual } from 'node:util';
import { type DeskScope } from '@/server/database/desk-scope';
import { ApiFailure } from '@/server/errors/api-failure';
import { ConflictError } from '@/server/errors/conflict-error';
import { GoneError } from '@/server/errors/gone-error';
import { InputError } from '@/server/errors/input-error';
import { BarStore } from '@/server/prices/bar-store';
import { type BarsChange, type OnBarsChanged, priceChanges } from '@/server/prices/bars-changed';
import { type BarPrices } from '@/server/prices/compare-bars';
import { buildPreview, type PreviewedFile } from '@/server/prices/build-preview';
import { readPriceFileFenced } from '@/server/prices/fenced-price-file';
import { type PriceUploadEntity } from '@/server/prices/price-upload-entity';
import { PriceUploadStore } from '@/server/prices/price-upload-store';
import { type PriceFileContent, type SettledReading } from '@/server/prices/reading/interpret-table';
import { PriceFileError } from '@/server/prices/reading/price-file-error';
import { QueueFullError, TurnQueue } from '@/server/runtime/turn-queue';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';
import { UnderlyingStore } from '@/server/underlyings/underlying-store';
import { type PriceUpload, type Reading } from '@/shared/prices/price-upload';

const keptHours = 24;
const keptMs = keptHours * 60 * 60 * 1_000;

interface StoredUpload {
  readonly id: string;
  readonly underlyingId: string;
  readonly fileName: string;
}

interface ReadingRequest {
  readonly upload: StoredUpload;
  readonly bytes: Uint8Array;
  readonly wanted: Reading | null;
  readonly shown: SettledReading | null;
}

export class PriceUploadService {
  private readonly queue = new TurnQueue({ atOnce: 2, waiting: 20 });

  constructor(
    private readonly deps: { readonly clock: Clock; readonly ids: Ids; readonly onBarsChanged: OnBarsChanged },
  ) {}

  async upload(
    scope: DeskScope,
    { underlyingId, file }: { underlyingId: string; file: { readonly path: string; readonly originalName: string } },
  ): Promise<PriceUpload> {
    await new UnderlyingStore(scope).get(underlyingId);
    const now = this.deps.clock.now();
    const store = new PriceUploadStore(scope);
    await store.clearOlderThan(new Date(now.getTime() - keptMs));
    const bytes = await readFile(file.path);
    const upload = { id: this.deps.ids.next(), underlyingId, fileName: file.originalName.slice(-255) };
    const content = await this.read(scope, { upload, bytes, wanted: null, shown: null });
    const { preview } = await this.previewOf(scope, upload, content);
    const settledReading = { reading: content.reading, answered: content.answered };
    await store.insert({ ...upload, state: 'preview', content: bytes, settledReading, preview, uploadedAt: now });
    return preview;
  }

  async show(scope: DeskScope, uploadId: string): Promise<PriceUpload> {
    return (await new PriceUploadStore(scope).get(uploadId)).preview;
  }

  /** Reads the same file as the person wants it read. */
  async reread(scope: DeskScope, uploadId: string, wanted: Reading): Promise<PriceUpload> {
    const store = new PriceUploadStore(scope);
    const row = await store.get(uploadId);
    if (row.state === 'committed') {
      throw new ConflictError('step-out-of-order', 'The bars of this file are already stored.');
    }
    const bytes = await this.bytesOf(store, row);
    const content = await this.read(scope, { upload: row, bytes, wanted, shown: row.settledReading });
    const { preview } = await this.previewOf(scope, row, content);
    await store.update(uploadId, { settledReading: { reading: content.reading, answered: content.answered }, preview });
    return preview;
  }

  /** Stores all bars of the file or none. What was stored already is answered again. */
  async commit(scope: DeskScope, uploadId: string): Promise<PriceUpload> {
    const outer = new PriceUploadStore(scope);
    const row = await outer.get(uploadId);
    if (row.state === 'committed') return row.preview;
    const bytes = await this.bytesOf(outer, row);
    const { reading } = row.settledReading;
    // Reading is long and needs no lock; the file and its reading do not change under it, the desk's bars may.
    const content = await this.read(scope, { upload: row, bytes, wanted: reading, shown: row.settledReading });
    const result = await scope.inTransaction((inner) => this.store(inner, row, content));
    if (result.kind === 'moved') {
      throw new ConflictError(
        'changed-elsewhere',
        'The bars of this underlying changed since the preview. Look at the changes again.',
        [],
        result.preview,
      );
    }
    if (result.change !== null) await this.deps.onBarsChanged(scope, result.change);
    return result.preview;
  }

  private async store(
    scope: DeskScope,
    shown: PriceUploadEntity,
    read: PriceFileContent,
  ): Promise<
    { kind: 'moved'; preview: PriceUpload } | { kind: 'stored'; preview: PriceUpload; change: BarsChange | null }
  > {
    const uploads = new PriceUploadStore(scope);
    const row = await uploads.get(shown.id, { locked: true });
    if (row.state === 'committed') return { kind: 'stored', preview: row.preview, change: null };
    if (!isDeepStrictEqual(row.settledReading, shown.settledReading)) return { kind: 'moved', preview: row.preview };
    await new UnderlyingStore(scope).hold(row.underlyingId);
    // Storing answers no question: those that were open when the file was shown are open still.
    const content = { ...read, questions: row.preview.questions };
    const { preview, compared, stored } = await this.previewOf(scope, row, content);
    if (!preview.canCommit) {
      throw new ConflictError(
        'step-out-of-order',
        preview.questions.length > 0
          ? 'The file leaves a question open. Answer it first.'
          : 'Some rows of the file cannot be taken, so nothing was stored.',
        preview.refused.map(({ row: line, message }) => ({ field: `rows.${line}`, message })),
      );
    }
    if (!isDeepStrictEqual(preview.changes, row.preview.changes)) {
      await uploads.update(row.id, { preview });
      return { kind: 'moved', preview };
    }
    const storedAt = this.deps.clock.now();
    const { underlyingId } = row;
    await new BarStore(scope).write(
      compared.writes.map(({ sessionDate, prices }) => ({
        id: this.deps.ids.next(),
        underlyingId,
        sessionDate,
        ...prices,
        settlement: null,
        source: 'upload',
        storedAt,
      })),
      { withSettlement: false },
    );
    const committed: PriceUpload = { ...preview, state: 'committed', canCommit: false };
    await uploads.update(row.id, { state: 'committed', content: null, preview: committed });
    const [first] = compared.writes;
    const prices = compared.writes.flatMap((write) =>
      priceChanges(write.sessionDate, stored.get(write.sessionDate) ?? null, write.prices),
    );
    return {
      kind: 'stored',
      preview: committed,
      change: first === undefined ? null : { underlyingId, fromSessionDate: first.sessionDate, prices },
    };
  }

  private async bytesOf(store: PriceUploadStore, { id, uploadedAt }: PriceUploadEntity): Promise<Buffer> {
    const isExpired = uploadedAt.getTime() + keptMs < this.deps.clock.now().getTime();
    const bytes = isExpired ? null : await store.content(id);
    if (bytes === null)
      throw new GoneError('upload-expired', `The file was cleared away; files are kept for ${keptHours} hours.`);
    return bytes;
  }

  private async previewOf(
    scope: DeskScope,
    upload: StoredUpload,
    content: PriceFileContent,
  ): Promise<PreviewedFile & { readonly stored: ReadonlyMap<string, BarPrices> }> {
    const stored = await new BarStore(scope).pricesByDate(upload.underlyingId);
    const { id, underlyingId, fileName } = upload;
    return { ...buildPreview({ upload: { id, underlyingId, fileName }, content, stored }), stored };
  }

  private async read(scope: DeskScope, { upload, bytes, wanted, shown }: ReadingRequest): Promise<PriceFileContent> {
    const now = this.deps.clock.now().toISOString();
    try {
      return await this.queue.run(scope.actor.personId, () =>
        readPriceFileFenced({ bytes, fileName: upload.fileName, wanted, shown, now }),
      );
    } catch (error) {
      if (error instanceof PriceFileError) throw failureOf(error);
      if (error instanceof QueueFullError)
        throw new ApiFailure('unavailable', 'Too many files are being read at this moment.');
      throw error;
    }
  }
}

function failureOf({ code, message }: PriceFileError): ApiFailure {
  return code === 'reading-invalid'
    ? new InputError([{ field: 'columns', message }], message)
    : new ApiFailure(code, message);
}
