import { type CSSProperties, type KeyboardEvent, useRef, useState } from 'react';
import { View } from 'react-native';
import { ChartKey } from '@/components/charts/chart-key';
import { priceText } from '@/components/charts/axis-number';
import { rovingCell } from '@/components/charts/roving-cell';
import { sigmaName } from '@/components/charts/sigma-scale';
import { translucent } from '@/components/charts/translucent';
import { formatNumber, formatOdds } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { type Colours } from '@/components/ui/theme/colours';
import { pageText } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';
import { useLayout } from '@/components/ui/use-layout';

interface LatticeRow {
  /** The underlying's move in deviations of the hold, and its price there. */
  readonly sigma: number;
  readonly price: number;
}

interface LatticeColumn {
  readonly label: string;
}

interface Props {
  /** Highest first. */
  readonly rows: readonly LatticeRow[];
  readonly columns: readonly LatticeColumn[];
  /** [row][column], in `unit`. */
  readonly profit: readonly (readonly number[])[];
  /** [row][column], fractions that sum to 1 down a column. */
  readonly likelihood: readonly (readonly number[])[];
  /** [row, column] of where it is now. */
  readonly current: readonly [number, number];
  /** Sizes, in `unit`: the strongest ground stands for them. */
  readonly largestLoss: number;
  readonly largestGain: number;
  readonly unit: string;
  /** What a number at the head of a column counts. */
  readonly columnUnit?: string;
  readonly caption?: string;
  readonly cellHeight?: number;
}

const LABEL = 56;

/** Profit by move and time as a real table: one stop for the keyboard, arrows walk the cells. */
export function ScenarioLattice(props: Props) {
  const {
    rows,
    columns,
    profit,
    likelihood,
    current,
    unit,
    columnUnit = 'sessions',
    caption = 'Profit by move and time',
  } = props;
  const colours = useColours();
  const { kind } = useLayout();
  const cellHeight = props.cellHeight ?? (kind === 'wide' ? 36 : 44);
  const [at, setAt] = useState({ row: current[0], column: current[1] });
  const [isRead, setIsRead] = useState(false);
  const cells = useRef(new Map<string, HTMLTableCellElement>());
  if (rows.length === 0 || columns.length === 0) return null;

  const stop = {
    row: Math.min(Math.max(0, at.row), rows.length - 1),
    column: Math.min(Math.max(0, at.column), columns.length - 1),
  };
  const cell = (row: number, column: number): LatticeCell => ({
    row: rows[row] ?? { sigma: NaN, price: NaN },
    column: columnWords(columns[column]?.label ?? '', columnUnit),
    profit: profit[row]?.[column] ?? NaN,
    likelihood: likelihood[row]?.[column] ?? NaN,
    unit,
  });
  const texts = rows.map((_, row) => columns.map((__, column) => wholeUnits(cell(row, column).profit)));
  const longest = Math.max(...texts.flat().map((text) => text.length));
  const onKeyDown = (event: KeyboardEvent) => {
    const next = rovingCell(event.key, stop, { rows: rows.length, columns: columns.length });
    if (next === null || event.altKey || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    setAt(next);
    cells.current.get(`${next.row}-${next.column}`)?.focus();
  };
  const looks = { cellHeight, isTight: longest > 5, colours };

  return (
    <View style={{ gap: 8 }}>
      <div style={{ overflowX: 'auto', padding: 4, margin: -4 }}>
        <table
          role="grid"
          aria-label={`${caption}, ${unit}`}
          onKeyDown={onKeyDown}
          style={{ ...tableStyle, minWidth: LABEL + columns.length * (longest * 7.2 + 8) }}
        >
          <thead>
            <tr>
              <td style={{ width: LABEL, padding: 0 }} />
              {columns.map(({ label }, column) => (
                <th
                  key={column}
                  scope="col"
                  aria-label={columnWords(label, columnUnit)}
                  style={{
                    ...pageText('note', column === current[1] ? 'semibold' : 'regular'),
                    color: column === current[1] ? colours.ink : colours.inkSoft,
                    height: 28,
                    padding: 0,
                  }}
                >
                  {label}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row, rowIndex) => (
              <tr key={rowIndex}>
                <RowHead row={row} colours={colours} />
                {columns.map((_, column) => {
                  const key = `${rowIndex}-${column}`;
                  const isCurrent = rowIndex === current[0] && column === current[1];
                  const content = cell(rowIndex, column);
                  const isStop = rowIndex === stop.row && column === stop.column;
                  return (
                    <td
                      key={key}
                      ref={(element) => {
                        if (element === null) cells.current.delete(key);
                        else cells.current.set(key, element);
                      }}
                      role="gridcell"
                      tabIndex={isStop ? 0 : -1}
                      aria-label={latticeCellWords(content, isCurrent)}
                      aria-current={isCurrent ? 'true' : undefined}
                      onFocus={() => {
                        setAt({ row: rowIndex, column });
                        setIsRead(true);
                      }}
                      onBlur={() => setIsRead(false)}
                      style={cellStyle(content, props, { ...looks, isCurrent, isFocused: isRead && isStop })}
                    >
                      {isCurrent ? null : <Edge likelihood={content.likelihood} colours={colours} />}
                      {wholeUnits(content.profit)}
                    </td>
                  );
                })}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <Txt size="note" aria-hidden weight={isRead ? 'medium' : 'regular'} colour={isRead ? 'ink' : 'inkSoft'}>
        {isRead ? latticeReadOut(cell(stop.row, stop.column)) : 'Choose a cell to read it in full.'}
      </Txt>
      <ChartKey
        items={[
          { key: 'likely', mark: 'likely', text: 'edge: how likely' },
          { key: 'current', mark: 'current', text: 'where it is now' },
        ]}
      />
    </View>
  );
}

// Stays in sight while wide cells scroll sideways.
const rowHeadStyle: CSSProperties = {
  position: 'sticky',
  left: 0,
  zIndex: 3,
  width: LABEL,
  padding: 0,
  textAlign: 'left',
  whiteSpace: 'nowrap',
};

const tableStyle: CSSProperties = { width: '100%', borderCollapse: 'separate', borderSpacing: 1, tableLayout: 'fixed' };

function RowHead({ row, colours }: { row: LatticeRow; colours: Colours }) {
  return (
    <th scope="row" style={{ ...rowHeadStyle, color: colours.ink, backgroundColor: colours.sheet }}>
      <span style={{ ...pageText('row', 'medium'), lineHeight: '17px', display: 'block' }}>{sigmaName(row.sigma)}</span>
      <span style={{ ...pageText('note'), lineHeight: '14px', display: 'block', color: colours.inkSoft }}>
        {priceText(row.price)}
      </span>
    </th>
  );
}

/** Width of a cell's left edge, in points: how likely the forecast finds it; none under 0.5%. */
export function likelihoodEdge(likelihood: number): number {
  return likelihood >= 0.005 ? Math.min(7, Math.max(1, 17 * likelihood)) : 0;
}

function Edge({ likelihood, colours }: { likelihood: number; colours: Colours }) {
  const width = likelihoodEdge(likelihood);
  if (width === 0) return null;
  return (
    <span
      aria-hidden
      style={{
        position: 'absolute',
        left: 0,
        top: 2,
        bottom: 2,
        width,
        backgroundColor: colours.ink,
        borderRadius: '0 1.5px 1.5px 0',
      }}
    />
  );
}

/** Opacity of a cell's ground: the largest loss is strongest, gains are read on a scale 1.8 times finer. */
export function latticeOpacity(profit: number, largestLoss: number, largestGain: number): number {
  const scale = largestLoss > 0 ? largestLoss : largestGain;
  const share = scale > 0 && Number.isFinite(profit) ? (Math.abs(profit) / scale) * (profit > 0 ? 1.8 : 1) : 0;
  return 0.04 + 0.34 * Math.min(1, share);
}

interface CellLook {
  readonly cellHeight: number;
  /** Long numbers are set smaller. */
  readonly isTight: boolean;
  readonly isCurrent: boolean;
  readonly isFocused: boolean;
  readonly colours: Colours;
}

function cellStyle(
  { profit, likelihood }: LatticeCell,
  { largestLoss, largestGain }: Pick<Props, 'largestLoss' | 'largestGain'>,
  { cellHeight, isTight, isCurrent, isFocused, colours }: CellLook,
): CSSProperties {
  const hue = profit < 0 ? colours.rust : colours.tide;
  return {
    ...pageText(isTight ? 'note' : 'row', isCurrent ? 'semibold' : 'regular'),
    position: 'relative',
    zIndex: isFocused ? 2 : isCurrent ? 1 : 0,
    height: cellHeight,
    padding: 0,
    paddingLeft: isCurrent ? 0 : likelihoodEdge(likelihood) * 0.8,
    textAlign: 'center',
    whiteSpace: 'nowrap',
    color: colours.ink,
    backgroundColor: Number.isFinite(profit)
      ? translucent(hue, latticeOpacity(profit, largestLoss, largestGain))
      : undefined,
    boxShadow: isCurrent ? `inset 0 0 0 2px ${colours.ink}` : undefined,
    outline: isFocused ? `2px solid ${colours.focus}` : 'none',
    outlineOffset: 2,
  };
}

const wholeUnits = (profit: number) => formatNumber(profit, 0, { sign: true });

function columnWords(label: string, unit: string): string {
  if (!/^\d/.test(label)) return label;
  return `${label} ${label === '1' && unit.endsWith('s') ? unit.slice(0, -1) : unit}`.trim();
}

export interface LatticeCell {
  readonly row: LatticeRow;
  /** In words: "6 sessions". */
  readonly column: string;
  readonly profit: number;
  readonly likelihood: number;
  readonly unit: string;
}

const likelihoodWords = (likelihood: number) =>
  Number.isFinite(likelihood) ? `, likelihood ${formatOdds(likelihood)}` : '';

/** "−1σ, 95.37, 6 sessions: −194, likelihood 12%". */
export function latticeReadOut({ row, column, profit, likelihood }: LatticeCell): string {
  return `${sigmaName(row.sigma)}, ${priceText(row.price)}, ${column}: ${wholeUnits(profit)}${likelihoodWords(likelihood)}`;
}

/** The same for screen readers, profit and loss in words. */
export function latticeCellWords({ row, column, profit, likelihood, unit }: LatticeCell, isCurrent = false): string {
  const amount = formatNumber(Math.abs(profit), 0);
  const result =
    profit < 0
      ? `loss ${amount} ${unit}`
      : profit > 0
        ? `profit ${amount} ${unit}`
        : profit === 0
          ? 'neither profit nor loss'
          : 'not known';
  return `${sigmaName(row.sigma)} at ${priceText(row.price)}, ${column}: ${result}${likelihoodWords(likelihood)}${isCurrent ? ', where it is now' : ''}`;
}
