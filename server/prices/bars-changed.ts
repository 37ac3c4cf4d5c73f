import { type DeskScope } from '@/server/database/desk-scope';

/** Told after bars were stored, with the first session that changed, so that outcomes can follow. */
export type OnBarsChanged = (scope: DeskScope, underlyingId: string, fromSessionDate: string) => Promise<void>;
