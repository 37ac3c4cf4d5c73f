import { useRouter } from 'expo-router';
import { View } from 'react-native';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { Card } from '@/components/ui/card';
import { Txt } from '@/components/ui/text';

const paragraphs: readonly (readonly [string, string])[] = [
  [
    'A record and a way to learn',
    'Brierbook keeps records and does arithmetic. Nothing in it is investment advice, a recommendation or an invitation to trade, and no mentor’s comment is either: mentors speak about process. Advice on particular trades for pay may need a licence. Local rules and licensed advisers come first.',
  ],
  [
    'What you can lose',
    'A bought option can lose its whole premium. A sold option can lose more than was received, and a sold call without other cover has no limit to its loss. An option of American style can be assigned at any time. A broker can ask for margin and can close positions. Read the standard document on the characteristics and risks of options before you trade.',
  ],
  [
    'What the odds are',
    'Odds, expected values and distributions are outputs of stated assumptions: a volatility, a drift, a model. They are hypothetical, change with their inputs, and guarantee nothing. The interval beside each figure shows only what follows from the uncertainty of the volatility; the world can do more. In several studies private traders of options lost money on average.',
  ],
  [
    'What the records are',
    'Realised profit here is not a tax report. Prices, calendars, fees and contract terms may be wrong: the records of your broker and of the clearing house rule.',
  ],
  [
    'Your data',
    'A journal is personal financial data. Brierbook sends it to nobody else and keeps none of it in your browser.',
  ],
];

/** The caution in full, to which every output leads. */
export function CautionScreen() {
  const router = useRouter();
  return (
    <ScreenFrame
      title="Estimates, not advice"
      back={{ label: 'Back', onPress: () => (router.canGoBack() ? router.back() : router.replace('/')) }}
    >
      <View style={{ gap: 12, maxWidth: 680 }}>
        {paragraphs.map(([title, text]) => (
          <Card key={title} title={title}>
            <Txt size="body">{text}</Txt>
          </Card>
        ))}
      </View>
    </ScreenFrame>
  );
}
