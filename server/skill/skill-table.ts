import { type SkillRow } from '@/journal/volatility-forecast/walk-forward';

export interface SeriesSkill {
  readonly series: string;
  readonly rows: readonly SkillRow[];
}

/** The rows of every series and their plain averages as lines of text; the default method carries a star. */
export function skillTable(all: readonly SeriesSkill[]): string[] {
  const parts = all.length > 1 ? [...all, { series: 'average', rows: averageRows(all) }] : all;
  const header = line(['series', 'sessions', 'method', 'log score', 'CRPS', 'in 68 %', 'in 95 %', 'forecasts']);
  return [header, ...parts.flatMap(({ series, rows }) => rows.map((row) => line(cells(series, row))))];
}

function averageRows(all: readonly SeriesSkill[]): SkillRow[] {
  const [first] = all;
  return (first?.rows ?? []).map((row, index) => {
    const mean = (valueOf: (row: SkillRow) => number) =>
      all.reduce((sum, { rows }) => sum + valueOf(rows[index] ?? row) / all.length, 0);
    return {
      ...row,
      logScore: mean(({ logScore }) => logScore),
      crps: mean(({ crps }) => crps),
      coverage68: mean(({ coverage68 }) => coverage68),
      coverage95: mean(({ coverage95 }) => coverage95),
      forecasts: all.reduce((sum, { rows }) => sum + (rows[index] ?? row).forecasts, 0),
    };
  });
}

function cells(series: string, row: SkillRow): string[] {
  const percent = (share: number) => (100 * share).toFixed(1);
  return [
    series,
    String(row.horizon),
    `${row.method}${row.isDefault ? ' *' : ''}`,
    row.logScore.toFixed(4),
    row.crps.toFixed(6),
    percent(row.coverage68),
    percent(row.coverage95),
    String(row.forecasts),
  ];
}

const widths = [12, 8, 20, 10, 9, 8, 8, 9];

function line(texts: readonly string[]): string {
  // Names to the left, numbers to the right.
  return texts
    .map((text, column) =>
      column === 0 || column === 2 ? text.padEnd(widths[column] ?? 0) : text.padStart(widths[column] ?? 0),
    )
    .join('  ')
    .trimEnd();
}
