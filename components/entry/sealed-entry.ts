import { type Entry } from '@/shared/entries/entry';

/** An entry whose plan is sealed: what the sections of its page work on. */
export type SealedEntry = Entry & { readonly sealed: NonNullable<Entry['sealed']> };
