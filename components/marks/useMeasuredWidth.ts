import { useState } from 'react';
import type { LayoutChangeEvent } from 'react-native';

/** The width a drawing has, once the page has laid it out; 0 before. Spread `onLayout` on the view around it. */
export function useMeasuredWidth(): { width: number; onLayout: (event: LayoutChangeEvent) => void } {
  const [width, setWidth] = useState(0);
  return { width, onLayout: (event) => setWidth(Math.floor(event.nativeEvent.layout.width)) };
}
