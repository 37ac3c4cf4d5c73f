import { Link } from 'expo-router';
import { type ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { LandingBell } from '@/components/charts/landing-bell';
import { BrandMark } from '@/components/ui/brand-mark';
import { Heading, Txt } from '@/components/ui/text';
import { breakpoints, space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useLayout } from '@/components/ui/use-layout';

interface Props {
  readonly title: string;
  readonly children: ReactNode;
  readonly foot: ReactNode;
}

/** The page around sign-in and sign-up: what the product is for at the left, the form at the right. */
export function AccountPage({ title, children, foot }: Props) {
  const colours = useColours();
  const { kind } = useLayout();
  const isWide = kind === 'wide';
  return (
    <ScrollView
      style={{ backgroundColor: colours.paper }}
      contentContainerStyle={{ flexGrow: 1, flexDirection: isWide ? 'row' : 'column' }}
    >
      <View
        role="banner"
        style={{ flexGrow: isWide ? 920 : 0, flexBasis: isWide ? 0 : 'auto', backgroundColor: colours.paper }}
      >
        <Introduction isWide={isWide} />
      </View>
      <View
        role="main"
        style={{
          flexGrow: isWide ? 520 : 1,
          flexBasis: isWide ? 0 : 'auto',
          backgroundColor: isWide ? colours.sheet : colours.paper,
          justifyContent: isWide ? 'center' : 'flex-start',
          padding: isWide ? 56 : space.gutterPhone,
          paddingTop: isWide ? 56 : 4,
          gap: 20,
        }}
      >
        <View style={{ gap: isWide ? 20 : 16, width: '100%', maxWidth: 420, alignSelf: 'center' }}>
          <Heading level={1} size={isWide ? 'title' : 'head'}>
            {title}
          </Heading>
          {children}
          {foot}
          <Txt size="note" colour="inkSoft">
            {'Estimates, not advice. Options can lose all that was paid, and short options more than was received. '}
            <Link href="/caution" style={{ color: colours.bramble, textDecorationLine: 'underline' }}>
              Full caution
            </Link>
          </Txt>
        </View>
      </View>
    </ScrollView>
  );
}

const example = { strike: 0.76, target: 0.91, landed: 0.95, totalDeviation: 0.026, spot: 100 };

function Introduction({ isWide }: { isWide: boolean }) {
  const priceAt = (sigma: number) => example.spot * Math.exp(sigma * example.totalDeviation);
  return (
    <View
      style={{
        padding: isWide ? 64 : space.gutterPhone,
        paddingTop: isWide ? 64 : 24,
        gap: isWide ? 40 : 12,
        width: '100%',
        maxWidth: breakpoints.wide - 120,
        flex: isWide ? 1 : undefined,
        justifyContent: 'center',
      }}
    >
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
        <BrandMark size={isWide ? 48 : 36} />
        <Txt serif size="title">
          Brierbook
        </Txt>
      </View>
      <Txt serif size={isWide ? 'opening' : 'head'}>
        Write the odds down before the trade. Score them after the close.
      </Txt>
      <LandingBell
        spot={example.spot}
        totalDeviation={example.totalDeviation}
        marks={[
          { kind: 'strike', price: priceAt(example.strike), sigma: example.strike, label: 'Strike' },
          { kind: 'target', price: priceAt(example.target), sigma: example.target, label: 'Target' },
        ]}
        landed={{ price: priceAt(example.landed), sigma: example.landed }}
      />
      <Txt size={isWide ? 'body' : 'row'} colour="inkSoft">
        The bell is what you expected; the berry is where it landed. Brierbook keeps both, for every trade in
        short-dated options.
      </Txt>
    </View>
  );
}
