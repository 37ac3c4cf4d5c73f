interface IconShape {
  /** Drawn with a 1.75 stroke on a box of 24. */
  readonly lines: string;
  /** Filled. */
  readonly dots?: string;
}

/** A filled circle as a path. */
const dot = (x: number, y: number, r: number) =>
  `M${x - r} ${y}a${r} ${r} 0 1 0 ${2 * r} 0a${r} ${r} 0 1 0 ${-2 * r} 0z`;
/** A circle as a line. */
const ring = (x: number, y: number, r: number) =>
  `M${x - r} ${y}a${r} ${r} 0 1 0 ${2 * r} 0a${r} ${r} 0 1 0 ${-2 * r} 0`;

const shapes = {
  today: {
    lines:
      'M2.5 16.5h19M7 20.25h10M7 16.5a5 5 0 0 1 10 0M12 5v2.5M4.9 8.9l1.7 1.7M19.1 8.9l-1.7 1.7M2.75 13h1.5M19.75 13h1.5',
  },
  journal: {
    lines:
      'M12 6.5C10.2 5.1 7.4 4.6 3.5 4.75V18c3.9-.15 6.7.4 8.5 1.75 1.8-1.35 4.6-1.9 8.5-1.75V4.75C16.6 4.6 13.8 5.1 12 6.5zM12 6.5v13.25',
  },
  prices: {
    lines: 'M3.5 20.25h17M4 15.5l4.75-5 3.75 3.25L20 5.5',
    dots: `${dot(8.75, 10.5, 1.6)}${dot(12.5, 13.75, 1.6)}${dot(20, 5.5, 1.6)}`,
  },
  scores: {
    lines: 'M4.5 3.5v16.25h16.25M7.75 16.5l2-1.4M17.75 6.25l2-1.75',
    dots: `${dot(9.5, 11.75, 1.35)}${dot(12.25, 13, 1.35)}${dot(14.25, 9.75, 1.35)}${dot(17, 10.25, 1.35)}${dot(19, 6.5, 1.35)}`,
  },
  desk: {
    lines:
      'M2.75 12.5h18.5M4.75 12.5v7.75M19.25 12.5v7.75M19.25 16.25h-6v-3.75M7 12.5V9.25M4.5 9.25h5L8.25 5h-2.5zM14 8.75h4M16 8.75v3.75',
  },
  plus: { lines: 'M12 4.75v14.5M4.75 12h14.5' },
  search: { lines: `${ring(10.5, 10.5, 6.25)}M15.25 15.25l5 5` },
  filter: { lines: 'M3.75 6.5h16.5M7 12h10M10.25 17.5h3.5' },
  check: { lines: 'M4.5 12.75l4.75 4.75L19.5 7' },
  close: { lines: 'M5.25 5.25l13.5 13.5M18.75 5.25l-13.5 13.5' },
  warning: { lines: 'M12 4L2.75 20h18.5zM12 10v4.5', dots: dot(12, 17.2, 1.1) },
  info: { lines: `${ring(12, 12, 8.75)}M12 11.25v5.25`, dots: dot(12, 7.9, 1.15) },
  seal: { lines: `${ring(12, 12, 8.75)}M7.25 14.5c2.4 0 2.9-5.5 4.75-5.5s2.35 5.5 4.75 5.5` },
  comment: { lines: 'M4 5h16v11.25h-9.25L6.75 20v-3.75H4z' },
  clock: { lines: `${ring(12, 12, 8.75)}M12 7v5.25l3.25 2` },
  print: { lines: 'M7 8.5V3.75h10V8.5M7 17.25H4.25V8.5h15.5v8.75H17M7 13.75h10v6.5H7z' },
  upload: { lines: 'M12 15.5V4M7.5 8.25L12 3.75l4.5 4.5M4.25 13.5v6.25h15.5V13.5' },
  download: { lines: 'M12 3.75v11.5M7.5 11L12 15.5l4.5-4.5M4.25 13.5v6.25h15.5V13.5' },
  covered: { lines: 'M3.25 9.5c2 3.3 5 5 8.75 5s6.75-1.7 8.75-5M6.5 13l-1.5 2.25M12 14.5v2.75M17.5 13l1.5 2.25' },
  uncovered: {
    lines: `M2.75 12C5 7.9 8.1 5.9 12 5.9S19 7.9 21.25 12C19 16.1 15.9 18.1 12 18.1S5 16.1 2.75 12z${ring(12, 12, 2.9)}`,
  },
  checklist: { lines: 'M3.75 6h14.5M3.75 11.25h9M3.75 16.5h6M13.25 16.75l2.5 2.5 5-5.5' },
  exercise: { lines: 'M3.25 12h12.5M11 7l5 5-5 5M20.25 4.5v15' },
  bars: { lines: 'M4.25 8.5v11M9.25 12v7.5M19.75 5v14.5M14.5 9.5v.01M14.5 13v.01M14.5 16.25v.01M14.5 19.5v.01' },
  pencil: { lines: 'M4 20l1-4.5L16.25 4.25l3.5 3.5L8.5 19zM13.75 6.75l3.5 3.5' },
  back: { lines: 'M20.25 12H4.25M10.5 5.5L4 12l6.5 6.5' },
  more: { lines: '', dots: `${dot(5, 12, 1.6)}${dot(12, 12, 1.6)}${dot(19, 12, 1.6)}` },
  offline: {
    lines:
      'M3.5 3.5l17 17M2.75 9.75c1.3-1.3 2.8-2.3 4.5-2.9M10.9 6.05c3.9-.35 7.6.85 10.35 3.7M6 13.25c1-.95 2.1-1.65 3.35-2.05M14.4 11.35c1.3.4 2.5 1.05 3.6 1.9M9.5 16.6c1.5-1.15 3.1-1.35 4.75-.5',
    dots: dot(12, 19.5, 1.4),
  },
  lock: { lines: 'M5 10.75h14v9.5H5zM8 10.75V7.5a4 4 0 0 1 8 0v3.25' },
  mail: { lines: 'M3.25 5.5h17.5v13H3.25zM3.5 6.25L12 13l8.5-6.75' },
  calendar: { lines: 'M4 5.75h16v14.5H4zM4 10.25h16M8.25 3.25v4M15.75 3.25v4' },
  'chevron-right': { lines: 'M9 5.5l6.5 6.5L9 18.5' },
  'chevron-down': { lines: 'M5.5 9l6.5 6.5L18.5 9' },
  trash: { lines: 'M4 6.5h16M9.25 6.25V3.75h5.5v2.5M6 6.75l1 13.5h10l1-13.5M10.25 10.5v6M13.75 10.5v6' },
  'sign-out': { lines: 'M13.5 4.25H4.75v15.5h8.75M9.75 12h10.75M16.5 7.5L21 12l-4.5 4.5' },
} satisfies Record<string, IconShape>;

export type IconName = keyof typeof shapes;
export const iconShapes: Record<IconName, IconShape> = shapes;
