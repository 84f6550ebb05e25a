import { Navigator, Slot, usePathname } from 'expo-router';
import { View } from 'react-native';
import { useAccount } from '../queries/account';
import { useTheme } from '../theme/ThemeProvider';
import { SkipLink } from '../ui/SkipLink';
import { Bar } from './Bar';
import { PageBoundary } from './PageBoundary';
import { placeOfPath, placesFor } from './places';
import { Rail } from './Rail';
import { MAIN_ID } from './Screen';
import { useBreakpoint } from './useBreakpoint';

/** The quadrant every page lies in: rail at the left from 900 px, bar below it on a phone. */
export function AppFrame() {
  const { wide, width, height } = useBreakpoint();
  const { colour } = useTheme();
  const account = useAccount();
  const path = usePathname();
  const places = placesFor(account);
  const current = placeOfPath(places, path);
  return (
    <View style={{ flex: 1, minHeight: 0, flexDirection: wide ? 'row' : 'column', backgroundColor: colour.ground }}>
      <SkipLink targetId={MAIN_ID} />
      {wide ? <Rail places={places} current={current} height={height} /> : null}
      <View style={{ flex: 1, minWidth: 0, minHeight: 0 }}>
        {/* The boundary lies inside the navigator: a page that failed must not take the history with it. */}
        <Navigator>
          <PageBoundary path={path}>
            <Slot />
          </PageBoundary>
        </Navigator>
      </View>
      {wide ? null : <Bar places={places} current={current} width={width} />}
    </View>
  );
}
