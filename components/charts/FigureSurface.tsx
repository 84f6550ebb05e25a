import type { ReactNode } from 'react';
import { Pressable } from 'react-native';
import type { XY } from './geometry';

export interface FigureSurfaceProps {
  width: number;
  height: number;
  onHover: (place: XY | null) => void;
  onTap: (place: XY) => void;
  children: ReactNode;
}

/** Where touches on the figure are taken, in px of the drawing. */
export function FigureSurface({ width, height, onTap, children }: FigureSurfaceProps) {
  return (
    <Pressable style={{ width, height }} onPress={(event) => onTap({ x: event.nativeEvent.locationX, y: event.nativeEvent.locationY })}>
      {children}
    </Pressable>
  );
}
