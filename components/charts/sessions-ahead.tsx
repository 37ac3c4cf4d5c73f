import { G, Line, Rect } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { KeySymbol } from '@/components/charts/chart-marks';
import { ChartText } from '@/components/charts/chart-text';
import { listWords } from '@/components/charts/list-words';
import { formatDate } from '@/components/ui/number-format';
import { useColours } from '@/components/ui/theme/use-theme';

export interface SessionAhead {
  /** 'YYYY-MM-DD'. */
  readonly date: string;
  readonly kind: 'full' | 'early' | 'closed';
  readonly marks: readonly ('expiry' | 'exDividend')[];
}

interface Props {
  /** Soonest first; as many are drawn as fit. */
  readonly sessions: readonly SessionAhead[];
  readonly width?: number;
}

const LEAST = 27;
const HEIGHT = 76;
const PIECE = 48;

/** A ruler of the coming sessions: short for an early close, dashed for a holiday, with expiries and ex-dividend days. */
export function SessionsAhead({ sessions, width }: Props) {
  return (
    <ChartCanvas label={sessionsAheadSentence(sessions)} height={HEIGHT} width={width}>
      {(shown) => <Ruler width={shown} sessions={sessions.slice(0, sessionsThatFit(shown))} />}
    </ChartCanvas>
  );
}

/** Days on a ruler of this width. */
export function sessionsThatFit(width: number): number {
  return Math.max(1, Math.floor(width / LEAST));
}

function Ruler({ width, sessions }: { width: number; sessions: readonly SessionAhead[] }) {
  const colours = useColours();
  // Few sessions are not stretched into a bar chart.
  const step = Math.min(44, width / Math.max(1, sessions.length));
  return sessions.map((session, index) => {
    const left = index * step;
    const middle = left + step / 2;
    const isClosed = session.kind === 'closed';
    const length = (step - 3) * (session.kind === 'early' ? 0.6 : 1);
    const before = sessions[index - 1];
    const startsWeek = before !== undefined && weekdayOf(session.date) < weekdayOf(before.date);
    return (
      <G key={session.date}>
        {startsWeek ? <Line x1={left} x2={left} y1={2} y2={HEIGHT - 2} stroke={colours.rule} /> : null}
        <ChartText x={middle} y={13} anchor="middle">
          {'SMTWTFS'[weekdayOf(session.date)] ?? ''}
        </ChartText>
        <ChartText
          x={middle}
          y={36}
          anchor="middle"
          size={14}
          weight={isClosed ? 'regular' : 'semibold'}
          colour={isClosed ? 'inkSoft' : 'ink'}
        >
          {String(Number(session.date.slice(8)))}
        </ChartText>
        <Rect
          x={middle - length / 2}
          y={isClosed ? PIECE - 3 : PIECE - 3}
          width={length}
          height={6}
          rx={3}
          fill={isClosed ? 'none' : colours.bramble}
          fillOpacity={0.6}
          stroke={isClosed ? colours.edge : 'none'}
          strokeDasharray={isClosed ? '2.5 2' : undefined}
        />
        {session.marks.map((mark, at) => (
          <G
            key={mark}
            transform={`translate(${middle - 8 + (at - (session.marks.length - 1) / 2) * 13},${PIECE + 7})`}
          >
            <KeySymbol mark={mark} colours={colours} />
          </G>
        ))}
      </G>
    );
  });
}

const weekdayOf = (date: string) => new Date(`${date}T00:00:00Z`).getUTCDay();

/** The ruler in one sentence. */
export function sessionsAheadSentence(sessions: readonly SessionAhead[]): string {
  const [first, last] = [sessions[0], sessions.at(-1)];
  if (first === undefined || last === undefined) return 'No sessions ahead are known.';
  const days = (name: string, isMeant: (session: SessionAhead) => boolean) => {
    const dates = sessions.filter(isMeant).map(({ date }) => formatDate(date, 'short'));
    return dates.length === 0 ? [] : [`${name} ${listWords(dates)}`];
  };
  const open = sessions.filter(({ kind }) => kind !== 'closed').length;
  return `${[
    `${open} ${open === 1 ? 'session' : 'sessions'}, ${formatDate(first.date, 'weekday')} to ${formatDate(last.date, 'weekday')}`,
    ...days('expiry', ({ marks }) => marks.includes('expiry')),
    ...days('ex-dividend', ({ marks }) => marks.includes('exDividend')),
    ...days('early close', ({ kind }) => kind === 'early'),
    ...days('closed', ({ kind }) => kind === 'closed'),
  ].join('; ')}.`;
}
