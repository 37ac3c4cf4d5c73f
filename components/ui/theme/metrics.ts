/** Sizes and line heights of text, in points. */
export const textSizes = {
  note: { fontSize: 12, lineHeight: 16 },
  row: { fontSize: 14, lineHeight: 20 },
  body: { fontSize: 16, lineHeight: 24 },
  head: { fontSize: 20, lineHeight: 26 },
  title: { fontSize: 26, lineHeight: 32 },
  figure: { fontSize: 34, lineHeight: 41 },
  opening: { fontSize: 36, lineHeight: 46 },
} as const;
export type TextSize = keyof typeof textSizes;

/** Font families as registered by `components/ui/theme/fonts`. */
export const fontFamilies = {
  serif: 'YoungSerif',
  sans: 'BrierbookSans',
  sansMedium: 'BrierbookSans-Medium',
  sansSemiBold: 'BrierbookSans-SemiBold',
} as const;

export const space = {
  gutterPhone: 16,
  gutterWide: 32,
  columnGap: 16,
  cardPadding: 16,
  cardPaddingWide: 20,
  cardGap: 12,
  sectionGap: 10,
  rowPadding: 12,
} as const;

export const radius = { control: 8, card: 10, chip: 12, pill: 999 } as const;

export const sizes = {
  target: 44,
  field: 48,
  button: 44,
  buttonMain: 48,
  chip: 24,
  topBar: 64,
  bottomBar: 64,
  rail: 96,
  railItem: 64,
  list: 420,
  margin: 316,
  anchors: 176,
  avatar: 36,
} as const;

/** Least widths, in points, at which the layout changes. */
export const breakpoints = { medium: 600, wide: 1024 } as const;
