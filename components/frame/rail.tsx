import { Link, usePathname } from 'expo-router';
import { Pressable, View } from 'react-native';
import { PlaceBadge } from '@/components/frame/place-badge';
import { placeOf, places, type PlaceKey } from '@/components/frame/places';
import { BrandMark } from '@/components/ui/brand-mark';
import { HiddenText } from '@/components/ui/hidden-text';
import { Icon } from '@/components/ui/icon';
import { Txt } from '@/components/ui/text';
import { radius, sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { initialsOf } from '@/components/ui/initials';

interface Props {
  readonly person?: { readonly displayName: string; readonly deskName: string };
  readonly badges: Partial<Record<PlaceKey, number>>;
}

/** The places at the left of a wide screen; at the foot who is signed in, and at which desk. */
export function Rail({ person, badges }: Props) {
  const colours = useColours();
  const current = placeOf(usePathname());
  return (
    <View
      role="navigation"
      aria-label="Places"
      style={{
        width: sizes.rail,
        alignItems: 'center',
        paddingTop: 20,
        paddingBottom: 16,
        borderRightWidth: 1,
        borderColor: colours.rule,
        backgroundColor: colours.sheet,
      }}
    >
      <BrandMark size={36} />
      <Txt serif size="body" style={{ lineHeight: 20, marginBottom: 24 }}>
        Brierbook
      </Txt>
      <View style={{ gap: 8 }}>
        {places.map(({ key, label, icon, href }) => {
          const isCurrent = key === current;
          return (
            <Link key={key} href={href} asChild>
              <Pressable
                role="link"
                {...(isCurrent ? { 'aria-current': 'page' } : {})}
                style={{
                  width: 80,
                  height: sizes.railItem,
                  alignItems: 'center',
                  justifyContent: 'center',
                  gap: 4,
                  borderRadius: radius.control,
                  backgroundColor: isCurrent ? colours.brambleWash : 'transparent',
                }}
              >
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
      <View style={{ flex: 1 }} />
      {person === undefined ? null : (
        <Link href="/desk" asChild>
          <Pressable role="link" style={{ alignItems: 'center', gap: 4, width: 88, borderRadius: radius.control }}>
            <View
              style={{
                width: 44,
                height: 44,
                borderRadius: 22,
                alignItems: 'center',
                justifyContent: 'center',
                backgroundColor: colours.well,
              }}
            >
              <Txt size="row" weight="semibold">
                <span aria-hidden>{initialsOf(person.displayName)}</span>
                <HiddenText>{`${person.displayName}, desk`}</HiddenText>
              </Txt>
            </View>
            <Txt size="note" colour="inkSoft" align="center" numberOfLines={2}>
              {person.deskName}
            </Txt>
          </Pressable>
        </Link>
      )}
    </View>
  );
}
