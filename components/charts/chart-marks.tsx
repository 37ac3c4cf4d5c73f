import { Circle, Line, Path, Rect } from 'react-native-svg';
import { type Colours } from '@/components/ui/theme/colours';

interface Triangle {
  /** Of the tip. */
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly fill: string;
}

/** A triangle whose tip points down at (x, y): a target, a notch. */
export function TriangleDown({ x, y, width, height, fill }: Triangle) {
  return <Path d={`M${x},${y}l${-width / 2},${-height}h${width}Z`} fill={fill} />;
}

/** A triangle whose tip points up at (x, y): a stop, a mean. */
export function TriangleUp({ x, y, width, height, fill }: Triangle) {
  return <Path d={`M${x},${y}l${-width / 2},${height}h${width}Z`} fill={fill} />;
}

interface Arrow {
  readonly end: 'low' | 'high';
  /** Of the drawing. */
  readonly width: number;
  readonly y: number;
  /** An open head: a reading that may still come back. */
  readonly isOpen: boolean;
  readonly colours: Colours;
}

/** An arrowhead at the edge: the reading went past ±3σ. */
export function PastArrow({ end, width, y, isOpen, colours }: Arrow) {
  const tip = end === 'high' ? width - 1 : 1;
  const back = end === 'high' ? -7 : 7;
  return (
    <Path
      d={`M${tip},${y}l${back},-6v12Z`}
      fill={isOpen ? colours.sheet : colours.ink}
      stroke={isOpen ? colours.ink : colours.sheet}
      strokeWidth={isOpen ? 2 : 1}
      strokeLinejoin="round"
    />
  );
}

interface Reading {
  readonly x: number;
  readonly y: number;
  readonly kind: 'landed' | 'now';
  readonly size: 'small' | 'large';
  readonly colours: Colours;
}

/** Where it landed, a filled dot, or where it is now, an open ring. */
export function ReadingDot({ x, y, kind, size, colours }: Reading) {
  const [dot, ring] = size === 'small' ? [4.8, 6.5] : [8, 10.5];
  return (
    <>
      <Circle cx={x} cy={y} r={ring} fill={colours.sheet} />
      {kind === 'landed' ? (
        <Circle cx={x} cy={y} r={dot} fill={colours.ink} />
      ) : (
        <Circle
          cx={x}
          cy={y}
          r={size === 'small' ? 5 : 7.5}
          fill={colours.sheet}
          stroke={colours.ink}
          strokeWidth={2}
        />
      )}
    </>
  );
}

export type KeyMark =
  | 'strike'
  | 'breakEven'
  | 'target'
  | 'stop'
  | 'landed'
  | 'now'
  | 'estimate'
  | 'interval'
  | 'market'
  | 'resampled'
  | 'likely'
  | 'current'
  | 'consistency'
  | 'thin'
  | 'diagonal'
  | 'event'
  | 'expiry'
  | 'exDividend';

/** A mark as a key shows it, in a box of 16 × 16. */
export function KeySymbol({ mark, colours }: { mark: KeyMark; colours: Colours }) {
  const { ink, bramble } = colours;
  switch (mark) {
    case 'strike':
      return <Line x1={8} y1={2} x2={8} y2={14} stroke={ink} strokeWidth={2} />;
    case 'breakEven':
    case 'event':
      return <Line x1={8} y1={2} x2={8} y2={14} stroke={ink} strokeWidth={1.5} strokeDasharray="2 3" />;
    case 'target':
      return <TriangleDown x={8} y={12} width={10} height={8} fill={colours.tide} />;
    case 'stop':
      return <TriangleUp x={8} y={4} width={10} height={8} fill={colours.rust} />;
    case 'landed':
      return <Circle cx={8} cy={8} r={4.8} fill={ink} />;
    case 'now':
      return <Circle cx={8} cy={8} r={4} fill="none" stroke={ink} strokeWidth={2} />;
    case 'estimate':
      return <Rect x={6.5} y={1} width={3} height={14} rx={1} fill={bramble} />;
    case 'interval':
      return (
        <Rect
          x={1}
          y={3}
          width={14}
          height={10}
          rx={3}
          fill={bramble}
          fillOpacity={0.3}
          stroke={bramble}
          strokeOpacity={0.65}
        />
      );
    case 'market':
      return <TriangleDown x={8} y={12} width={10} height={8} fill={ink} />;
    case 'resampled':
      return <Circle cx={8} cy={8} r={4.5} fill="none" stroke={bramble} strokeWidth={2} />;
    case 'likely':
      return <Rect x={5} y={2} width={5} height={12} rx={1} fill={ink} />;
    case 'current':
      return <Rect x={2} y={2} width={12} height={12} fill="none" stroke={ink} strokeWidth={2} />;
    case 'consistency':
      return (
        <Rect
          x={1}
          y={3}
          width={14}
          height={10}
          fill={bramble}
          fillOpacity={0.12}
          stroke={bramble}
          strokeOpacity={0.55}
        />
      );
    case 'thin':
      return <Circle cx={8} cy={8} r={5} fill="none" stroke={bramble} strokeWidth={1.75} strokeDasharray="1.6 1.9" />;
    case 'diagonal':
      return <Line x1={1} y1={13} x2={15} y2={3} stroke={ink} strokeWidth={1.25} />;
    case 'expiry':
      return <Path d="M8,3l5,5l-5,5l-5,-5Z" fill={ink} />;
    case 'exDividend':
      return <Path d="M2,8h9M7.5,4.5L11,8L7.5,11.5M13,3.5v9" stroke={ink} strokeWidth={1.5} fill="none" />;
  }
}
