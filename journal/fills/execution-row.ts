import { type Fill } from '@/journal/fills/fill';

/** A row of an account's record of executions. A later row may correct an earlier one or bust it; nothing is ever overwritten. */
export type ExecutionRow =
  | { readonly kind: 'trade'; readonly fill: Fill }
  | {
      readonly kind: 'correction';
      /** The execution as it should have been. Its own time is that of the report. */
      readonly fill: Fill;
      /** Id of the row it replaces: the first report, or an earlier correction of it. */
      readonly corrects: string;
    }
  | {
      readonly kind: 'bust';
      readonly id: string;
      readonly reportedAt: string;
      readonly sequence: number;
      /** Id of the row that it cancels, or of any row of the same chain of corrections. */
      readonly busts: string;
    };

/** What became of a row. Every row stays visible, linked with the one that acted on it or on which it acted. */
export type RowState =
  /** Counts. `linkedId`: of a correction, what it corrected; else null. */
  | 'effective'
  /** Replaced by the correction `linkedId`. */
  | 'corrected'
  /** Cancelled by the bust `linkedId`. */
  | 'busted'
  /** A bust that cancelled `linkedId`. */
  | 'bust'
  /** The same row once more; `linkedId` is its id. */
  | 'duplicate'
  /** Another row under an id already taken: to be looked at; not counted. */
  | 'conflict'
  /** Refers to a row that is not there, was busted, or refers back to it: to be looked at; not counted. */
  | 'unresolved';

export interface JudgedRow {
  readonly row: ExecutionRow;
  readonly state: RowState;
  readonly linkedId: string | null;
}

export interface AppliedCorrections {
  /** What counts, in order of effect; a correction stands at the time and place of what it corrects, under its own id. */
  readonly effective: readonly Fill[];
  /** Every row, in the order given. */
  readonly rows: readonly JudgedRow[];
}
