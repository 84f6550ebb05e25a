import { createContext, useContext, useMemo, useState, type ReactNode } from 'react';
import { useColorScheme } from 'react-native';
import { colours, type Colours, type ThemeName } from './tokens';
import { recallTheme, rememberTheme } from './rememberedTheme';
import { usePageStyle } from './usePageStyle';

export interface Theme {
  name: ThemeName;
  colour: Colours;
  /** Choose a theme; the choice is remembered on this device. */
  choose: (name: ThemeName) => void;
}

const ThemeContext = createContext<Theme | null>(null);

/** Holds the theme: the remembered choice, else what the system asks for. */
export function ThemeProvider({ children }: { children: ReactNode }) {
  const system = useColorScheme();
  const [chosen, setChosen] = useState<ThemeName | null>(recallTheme);
  const name: ThemeName = chosen ?? (system === 'dark' ? 'darkfield' : 'brightfield');
  usePageStyle(name);
  const theme = useMemo<Theme>(
    () => ({
      name,
      colour: colours[name],
      choose: (next) => {
        rememberTheme(next);
        setChosen(next);
      },
    }),
    [name],
  );
  return <ThemeContext.Provider value={theme}>{children}</ThemeContext.Provider>;
}

/** Shows its children in a named theme whatever the page's is: the counting pad begins in darkfield. */
export function ThemeScope({ name, children }: { name: ThemeName; children: ReactNode }) {
  const outer = useTheme();
  const theme = useMemo<Theme>(() => ({ name, colour: colours[name], choose: outer.choose }), [name, outer.choose]);
  return <ThemeContext.Provider value={theme}>{children}</ThemeContext.Provider>;
}

/** The theme in force: its name, its colours and `choose`. */
export function useTheme(): Theme {
  const theme = useContext(ThemeContext);
  if (!theme) throw new Error('useTheme needs a ThemeProvider above it');
  return theme;
}
