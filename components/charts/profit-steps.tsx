import { scaleLinear } from 'd3-scale';
import { View } from 'react-native';
import { Circle, G, Line, Path, Rect } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { SignedAmount } from '@/components/ui/signed-amount';
import { Rule } from '@/components/ui/rule';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';

export interface ProfitStep {
  readonly label: string;
  /** Decimal text, signed. */
  readonly amount: string;
}

interface Props {
  /** Mean of the sealed distribution: stands first, on the same scale. */
  readonly expectedMean: number;
  readonly expectedLabel?: string;
  /** They add up to `realised`. */
  readonly steps: readonly ProfitStep[];
  readonly realised: string;
  readonly currency: string;
}

const ROW = 30;
const LABEL = 104;
const AMOUNT = 92;

/** Steps from zero to the realised profit, with the expected mean as an open diamond on the same scale. */
export function ProfitSteps({ expectedMean, expectedLabel = 'Expected mean', steps, realised, currency }: Props) {
  const rows = [
    { key: 'expected', label: expectedLabel, amount: expectedMean, isStrong: true },
    ...steps.map(({ label, amount }) => ({ key: label, label, amount, isStrong: false })),
  ];
  return (
    <View>
      <View style={{ position: 'relative' }}>
        {/* Behind the words, which say all of it. */}
        <View style={{ position: 'absolute', left: LABEL, right: AMOUNT, top: 0 }} aria-hidden>
          <ChartCanvas label={null} height={ROW * (rows.length + 1)}>
            {(width) => <Steps width={width} expectedMean={expectedMean} steps={steps} />}
          </ChartCanvas>
        </View>
        <View role="list">
          {rows.map(({ key, label, amount, isStrong }) => (
            <Row key={key} label={label} amount={amount} currency={currency} isStrong={isStrong} />
          ))}
          <View role="listitem">
            <Rule />
            <RowWords label="Realised" amount={realised} currency={currency} isStrong />
          </View>
        </View>
      </View>
    </View>
  );
}

interface RowProps {
  readonly label: string;
  readonly amount: string | number;
  readonly currency: string;
  readonly isStrong: boolean;
}

const Row = (props: RowProps) => (
  <View role="listitem">
    <RowWords {...props} />
  </View>
);

function RowWords({ label, amount, currency, isStrong }: RowProps) {
  return (
    <View style={{ height: ROW, flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between' }}>
      <Txt size="row" weight={isStrong ? 'semibold' : 'regular'}>
        {label}
      </Txt>
      <SignedAmount value={amount} currency={currency} size="row" places={2} />
    </View>
  );
}

function Steps({ width, expectedMean, steps }: { width: number } & Pick<Props, 'expectedMean' | 'steps'>) {
  const colours = useColours();
  const levels = steps.reduce<number[]>((sums, { amount }) => [...sums, (sums.at(-1) ?? 0) + Number(amount)], []);
  const x = scaleLinear(
    [Math.min(0, expectedMean, ...levels), Math.max(0, expectedMean, ...levels)],
    [10, Math.max(11, width - 10)],
  );
  const middleOf = (row: number) => (row + 0.5) * ROW;
  const end = levels.at(-1) ?? 0;
  return (
    <>
      <Line x1={x(0)} x2={x(0)} y1={4} y2={ROW * (steps.length + 2) - 4} stroke={colours.edge} />
      <Path
        d={`M${x(expectedMean)},${middleOf(0) - 6}l5,6l-5,6l-5,-6Z`}
        fill={colours.sheet}
        stroke={colours.ink}
        strokeWidth={1.5}
      />
      {steps.map(({ label, amount }, index) => {
        const before = levels[index - 1] ?? 0;
        const after = levels[index] ?? 0;
        const row = middleOf(index + 1);
        const isGain = Number(amount) >= 0;
        return (
          <G key={label}>
            <Rect
              x={Math.min(x(before), x(after))}
              y={row - 7}
              width={Math.max(1.5, Math.abs(x(after) - x(before)))}
              height={14}
              fill={isGain ? colours.tide : colours.rust}
            />
            <Line x1={x(after)} x2={x(after)} y1={row + 7} y2={row + ROW - 7} stroke={colours.ink} />
          </G>
        );
      })}
      <Circle cx={x(end)} cy={middleOf(steps.length + 1)} r={5} fill={colours.ink} />
    </>
  );
}
