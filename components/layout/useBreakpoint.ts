import { useWindowDimensions } from 'react-native';
import { breakpoints } from '../theme/tokens';

export interface Breakpoint {
  width: number;
  height: number;
  /** From 900 px: the rail stands at the left, tables are tables. */
  wide: boolean;
  /** From 1200 px: lists and details stand side by side. */
  sideBySide: boolean;
}

/** The width of the window in the three steps of the layout. */
export function useBreakpoint(): Breakpoint {
  const { width, height } = useWindowDimensions();
  return { width, height, wide: width >= breakpoints.rail, sideBySide: width >= breakpoints.sideBySide };
}
