import { View } from 'react-native';
import Svg, { Circle, Path } from 'react-native-svg';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';
import { type EntryState } from '@/shared/entries/entry';

const words: Record<EntryState, string> = {
  draft: 'Draft',
  sealed: 'Sealed',
  open: 'Open',
  closed: 'Closed',
  reviewed: 'Reviewed',
  abandoned: 'Abandoned',
};

interface Props {
  readonly state: EntryState;
  /** False only where the word stands right beside it anyway. */
  readonly withWord?: boolean;
  readonly size?: number;
}

/** An entry ripens: dotted outline, ring with a seed, half, full, full with a check; crossed when abandoned. */
export function StateBerry({ state, withWord = true, size = 12 }: Props) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 6 }}>
      <Svg width={size} height={size} viewBox="0 0 12 12" fill="none" aria-hidden>
        <Berry state={state} />
      </Svg>
      {withWord ? (
        <Txt size="note" weight="medium">
          {words[state]}
        </Txt>
      ) : null}
    </View>
  );
}

function Berry({ state }: { state: EntryState }) {
  const { bramble, inkSoft, leaf, sheet } = useColours();
  const ring = <Circle cx={6} cy={6} r={5} stroke={bramble} strokeWidth={1.5} />;
  switch (state) {
    case 'draft':
      return <Circle cx={6} cy={6} r={5} stroke={inkSoft} strokeWidth={1.5} strokeDasharray="1.9 2.03" />;
    case 'sealed':
      return (
        <>
          {ring}
          <Circle cx={6} cy={6} r={2} fill={bramble} />
        </>
      );
    case 'open':
      return (
        <>
          {ring}
          <Path d="M6 1a5 5 0 0 0 0 10z" fill={bramble} />
        </>
      );
    case 'closed':
      return <Circle cx={6} cy={6} r={5.5} fill={bramble} />;
    case 'reviewed':
      return (
        <>
          <Circle cx={6} cy={6} r={5.75} fill={leaf} />
          <Path
            d="M3.4 6.2l1.9 1.9 3.5-3.9"
            stroke={sheet}
            strokeWidth={1.5}
            strokeLinecap="round"
            strokeLinejoin="round"
          />
        </>
      );
    case 'abandoned':
      return (
        <>
          <Circle cx={6} cy={6} r={5} stroke={inkSoft} strokeWidth={1.5} />
          <Path d="M2.6 9.4l6.8-6.8" stroke={inkSoft} strokeWidth={1.5} />
        </>
      );
  }
}
