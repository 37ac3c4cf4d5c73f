import { z } from 'zod';
import { defineEndpoint } from '@/shared/contract/define-endpoint';
import { idSchema } from '@/shared/contract/fields';
import { noInput } from '@/shared/contract/no-input';
import { journalRoles } from '@/shared/contract/roles';
import { priceUploadSchema, readingSchema } from '@/shared/prices/price-upload';

/** Largest price file, in bytes, and most rows in it. */
export const priceFileLimits = { bytes: 20 * 1024 * 1024, rows: 100_000 } as const;

const access = { kind: 'desk', roles: journalRoles, rows: 'own' } as const;
const uploadParams = z.strictObject({ uploadId: idSchema });

export const priceUploadEndpoints = {
  uploadPrices: defineEndpoint({
    name: 'uploadPrices',
    method: 'POST',
    path: '/underlyings/:underlyingId/price-uploads',
    summary: 'Read a file of daily bars (CSV, TSV or XLSX) and show what it would change',
    access,
    params: z.strictObject({ underlyingId: idSchema }),
    query: noInput,
    body: 'file',
    needsVersion: false,
    status: 201,
    response: priceUploadSchema,
  }),
  readPriceUpload: defineEndpoint({
    name: 'readPriceUpload',
    method: 'GET',
    path: '/price-uploads/:uploadId',
    summary: 'The preview of an upload',
    access,
    params: uploadParams,
    query: noInput,
    body: null,
    needsVersion: false,
    status: 200,
    response: priceUploadSchema,
  }),
  rereadPriceUpload: defineEndpoint({
    name: 'rereadPriceUpload',
    method: 'PUT',
    path: '/price-uploads/:uploadId/reading',
    summary: 'Read the same file another way: answers to its questions',
    access,
    params: uploadParams,
    query: noInput,
    body: readingSchema,
    needsVersion: false,
    status: 200,
    response: priceUploadSchema,
  }),
  commitPriceUpload: defineEndpoint({
    name: 'commitPriceUpload',
    method: 'POST',
    path: '/price-uploads/:uploadId/commit',
    summary: 'Store all bars of an upload, or none',
    access,
    params: uploadParams,
    query: noInput,
    body: null,
    needsVersion: false,
    status: 200,
    response: priceUploadSchema,
  }),
};
