import { darkColours, lightColours, type ColourName, type Colours } from '@/components/ui/theme/colours';

const schemes: readonly (readonly [string, Colours])[] = [
  ['light', lightColours],
  ['dark', darkColours],
];

/** Words on their ground: WCAG 2.2, success criterion 1.4.3. */
const textPairs: readonly (readonly [ColourName, ColourName])[] = [
  ...(
    ['paper', 'sheet', 'well', 'brambleWash', 'stripBase', 'leafWash', 'tideWash', 'rustWash', 'amberWash'] as const
  ).map((ground) => ['ink', ground] as const),
  ...(['paper', 'sheet', 'well'] as const).map((ground) => ['inkSoft', ground] as const),
  ...(['paper', 'sheet', 'well', 'brambleWash'] as const).map((ground) => ['bramble', ground] as const),
  ['onBramble', 'bramble'],
  ...(['paper', 'sheet', 'leafWash'] as const).map((ground) => ['leaf', ground] as const),
  ...(['paper', 'sheet', 'tideWash'] as const).map((ground) => ['tide', ground] as const),
  ...(['paper', 'sheet', 'well', 'rustWash'] as const).map((ground) => ['rust', ground] as const),
  ['amber', 'amberWash'],
  ['paper', 'ink'],
];

/** Edges of controls and marks beside their ground: WCAG 2.2, success criterion 1.4.11. */
const markPairs: readonly (readonly [ColourName, ColourName])[] = [
  ...(['paper', 'sheet', 'well'] as const).map((ground) => ['edge', ground] as const),
  ...(['paper', 'sheet', 'well', 'brambleWash'] as const).map((ground) => ['focus', ground] as const),
];

function channels(colour: string): number[] {
  const hex = /^#([0-9A-F]{2})([0-9A-F]{2})([0-9A-F]{2})$/.exec(colour);
  if (hex === null) throw new Error(`${colour} is no #RRGGBB colour`);
  return hex.slice(1).map((pair) => parseInt(pair, 16) / 255);
}

function luminance(rgb: readonly number[]): number {
  const [red = 0, green = 0, blue = 0] = rgb.map((part) =>
    part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4,
  );
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(first: readonly number[], second: readonly number[]): number {
  const [dark = 0, light = 0] = [luminance(first), luminance(second)].sort((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
}

describe.each(schemes)('the %s colours', (_, colours) => {
  it.each(textPairs)('write %s on %s at 4.5 to 1 or more', (ink, ground) => {
    expect(contrast(channels(colours[ink]), channels(colours[ground]))).toBeGreaterThanOrEqual(4.5);
  });

  it.each(markPairs)('mark with %s on %s at 3 to 1 or more', (mark, ground) => {
    expect(contrast(channels(colours[mark]), channels(colours[ground]))).toBeGreaterThanOrEqual(3);
  });

  it('keep the words of a pressed primary button, its ground at 85%, at 4.5 to 1 or more', () => {
    const bramble = channels(colours.bramble);
    const sheet = channels(colours.paper);
    const pressed = bramble.map((part, index) => 0.85 * part + 0.15 * (sheet[index] ?? 0));
    expect(contrast(channels(colours.onBramble), pressed)).toBeGreaterThanOrEqual(4.5);
  });
});

it('measures black on white as 21 to 1', () => {
  expect(contrast(channels('#000000'), channels('#FFFFFF'))).toBeCloseTo(21, 10);
});
