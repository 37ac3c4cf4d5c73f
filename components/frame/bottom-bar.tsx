import { Link, usePathname } from 'expo-router';
import { Pressable, View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { PlaceBadge } from '@/components/frame/place-badge';
import { placeOf, places, type PlaceKey } from '@/components/frame/places';
import { Icon } from '@/components/ui/icon';
import { Txt } from '@/components/ui/text';
import { sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';

/** The five places at the foot of a phone. */
export function BottomBar({ badges }: { badges: Partial<Record<PlaceKey, number>> }) {
  const colours = useColours();
  const current = placeOf(usePathname());
  return (
    <View
      role="navigation"
      aria-label="Places"
      style={{ backgroundColor: colours.sheet, borderTopWidth: 1, borderColor: colours.rule }}
    >
      <View style={{ flexDirection: 'row', height: sizes.bottomBar }}>
        {places.map(({ key, label, icon, href }) => {
          const isCurrent = key === current;
          return (
            <Link key={key} href={href} asChild>
              <Pressable
                role="link"
                {...(isCurrent ? { 'aria-current': 'page' } : {})}
                style={{ flex: 1, alignItems: 'center', justifyContent: 'center', gap: 3 }}
              >
                {isCurrent ? <Arc colour={colours.bramble} ground={colours.sheet} /> : null}
                <View>
                  <Icon name={icon} colour={isCurrent ? 'bramble' : 'inkSoft'} />
                  <PlaceBadge count={badges[key]} />
                </View>
                <Txt size="note" weight={isCurrent ? 'semibold' : 'medium'} colour={isCurrent ? 'bramble' : 'inkSoft'}>
                  {label}
                </Txt>
              </Pressable>
            </Link>
          );
        })}
      </View>
      <div style={{ height: 'env(safe-area-inset-bottom, 0px)' }} />
    </View>
  );
}

/** The bell of the brand, standing on the edge of the bar over the active place. */
function Arc({ colour, ground }: { colour: string; ground: string }) {
  const curve = 'M1 6.5C7.5 6.5 9 1 14 1s6.5 5.5 13 5.5';
  return (
    <View style={{ position: 'absolute', top: -6, left: 0, right: 0, alignItems: 'center', pointerEvents: 'none' }}>
      <Svg width={28} height={8} viewBox="0 0 28 8" fill="none" aria-hidden>
        <Path d={`${curve}V8H1z`} fill={ground} />
        <Path d={curve} stroke={colour} strokeWidth={2} strokeLinecap="round" />
      </Svg>
    </View>
  );
}
