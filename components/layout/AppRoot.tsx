import { useFonts } from 'expo-font';
import { SafeAreaProvider } from 'react-native-safe-area-context';
import { QueryProvider } from '../queries/QueryProvider';
import { fontSources } from '../theme/fonts';
import { ThemeProvider } from '../theme/ThemeProvider';
import { NoticeProvider } from '../ui/NoticeProvider';
import { AppFrame } from './AppFrame';

const fonts = fontSources();

/** Providers around everything. Text shows in a fall-back face until the bundled fonts are there. */
export function AppRoot() {
  useFonts(fonts);
  return (
    <SafeAreaProvider>
      <ThemeProvider>
        <QueryProvider>
          <NoticeProvider>
            <AppFrame />
          </NoticeProvider>
        </QueryProvider>
      </ThemeProvider>
    </SafeAreaProvider>
  );
}
