import { Fragment, type CSSProperties, type ReactNode } from 'react';
import { HiddenText } from '@/components/ui/hidden-text';
import { pageText } from '@/components/ui/theme/type-face';
import { type Colours } from '@/components/ui/theme/colours';
import { useColours } from '@/components/ui/theme/use-theme';
import { useOverflows } from '@/components/ui/use-overflows';

export interface TableColumn {
  readonly key: string;
  /** With the unit of the numbers under it. */
  readonly header: string;
  readonly align?: 'left' | 'right';
  /** In points. */
  readonly width?: number;
  /** Share of the room that is left; 1 unless told. */
  readonly flex?: number;
}

export interface TableRow {
  readonly key: string;
  readonly cells: Readonly<Record<string, ReactNode>>;
  /** A line of words under the cells. */
  readonly note?: string;
  readonly isChosen?: boolean;
}

interface Props {
  readonly columns: readonly TableColumn[];
  readonly rows: readonly TableRow[];
  /** What the table shows; for screen readers. */
  readonly caption: string;
  /** Under this width, in points, it scrolls sideways in its place. */
  readonly minWidth?: number;
  /** Room at the left and right of the cells, where the table fills a card from edge to edge. */
  readonly inset?: number;
}

/** A real table: a header to each column, the first cell heads its row, numbers at the right. */
export function DataTable({ columns, rows, caption, minWidth, inset = 0 }: Props) {
  const colours = useColours();
  const { ref, overflows } = useOverflows();
  return (
    <div
      ref={ref}
      style={{ overflowX: 'auto', maxWidth: '100%' }}
      {...(overflows ? { role: 'region', 'aria-label': caption, tabIndex: 0 } : {})}
    >
      <table style={{ width: '100%', minWidth, borderCollapse: 'collapse', color: colours.ink, ...pageText('row') }}>
        <caption style={{ height: 0, padding: 0 }}>
          <HiddenText>{caption}</HiddenText>
        </caption>
        <colgroup>
          {columns.map((column) => (
            <col key={column.key} style={{ width: columnWidth(column, columns) }} />
          ))}
        </colgroup>
        <thead>
          <tr>
            {columns.map((column, index) => {
              const style = { ...cellStyle(colours, column, index, columns.length, inset), ...headStyle(colours) };
              return column.header === '' ? (
                <td key={column.key} style={style} />
              ) : (
                <th key={column.key} scope="col" style={style}>
                  {column.header}
                </th>
              );
            })}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Fragment key={row.key}>
              <tr style={row.isChosen ? { backgroundColor: colours.brambleWash } : undefined}>
                {columns.map((column, index) => (
                  <Cell
                    key={column.key}
                    isRowHead={index === 0}
                    style={{
                      ...cellStyle(colours, column, index, columns.length, inset),
                      ...(row.note ? { paddingBottom: 0 } : {}),
                    }}
                  >
                    {row.cells[column.key]}
                  </Cell>
                ))}
              </tr>
              {row.note ? (
                <tr>
                  <td
                    colSpan={columns.length}
                    style={{
                      ...pageText('note'),
                      color: colours.inkSoft,
                      padding: `0 ${inset}px 8px`,
                      textAlign: 'left',
                    }}
                  >
                    {row.note}
                  </td>
                </tr>
              ) : null}
            </Fragment>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Cell({ isRowHead, style, children }: { isRowHead: boolean; style: CSSProperties; children: ReactNode }) {
  return isRowHead ? (
    <th scope="row" style={style}>
      {children}
    </th>
  ) : (
    <td style={style}>{children}</td>
  );
}

function columnWidth(column: TableColumn, columns: readonly TableColumn[]): number | string | undefined {
  if (column.width !== undefined) return column.width;
  if (columns.every(({ flex }) => flex === undefined)) return undefined;
  const shared = columns.filter(({ width }) => width === undefined).reduce((sum, { flex }) => sum + (flex ?? 1), 0);
  return `${(100 * (column.flex ?? 1)) / shared}%`;
}

function cellStyle(colours: Colours, column: TableColumn, index: number, count: number, inset: number): CSSProperties {
  return {
    borderTop: `1px solid ${colours.rule}`,
    padding: '9px 0',
    paddingLeft: index === 0 ? inset : 8,
    paddingRight: index === count - 1 ? inset : 8,
    height: 40,
    boxSizing: 'border-box',
    textAlign: column.align ?? 'left',
    verticalAlign: 'baseline',
    fontWeight: 'inherit',
    ...(column.align === 'right' ? { whiteSpace: 'nowrap' } : {}),
  };
}

function headStyle(colours: Colours): CSSProperties {
  return {
    ...pageText('note'),
    color: colours.inkSoft,
    borderTop: 0,
    height: 28,
    padding: undefined,
    paddingTop: 4,
    paddingBottom: 6,
  };
}
