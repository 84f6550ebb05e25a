import { Link } from 'expo-router';
import { Pressable, Text as NativeText, type StyleProp, type ViewStyle } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { fontFamily } from '../theme/typography';
import { spokenPlace, type Place } from './places';

interface PlaceLinkProps {
  place: Place;
  current: boolean;
  fontSize: number;
  style: StyleProp<ViewStyle>;
}

/** The label of a place at its tick; what waits there stands raised beside it. */
export function PlaceLink({ place, current, fontSize, style }: PlaceLinkProps) {
  const { colour } = useTheme();
  return (
    <Link href={place.href} asChild>
      <Pressable role="link" aria-label={spokenPlace(place)} aria-current={current ? 'page' : undefined} style={style}>
        <NativeText style={{ fontFamily: fontFamily(current ? 'sansSemibold' : 'sans'), fontSize, lineHeight: 24, color: current ? colour.ink : colour.inkSoft }}>{place.label}</NativeText>
        {place.waiting > 0 ? (
          <NativeText style={{ fontFamily: fontFamily('sansSemibold'), fontSize: 13, lineHeight: 16, marginLeft: 2, marginTop: -2, color: colour.waiting }}>{place.waiting}</NativeText>
        ) : null}
      </Pressable>
    </Link>
  );
}
