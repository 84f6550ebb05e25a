import type { MouseEvent } from 'react';
import type { FigureSurfaceProps } from './FigureSurface';
import type { XY } from './geometry';

function placeOf(event: MouseEvent<HTMLDivElement>): XY {
  const box = event.currentTarget.getBoundingClientRect();
  return { x: event.clientX - box.left, y: event.clientY - box.top };
}

/** Where pointer and touches on the figure are taken, in px of the drawing. */
export function FigureSurface({ width, height, onHover, onTap, children }: FigureSurfaceProps) {
  return (
    <div
      style={{ width, height, position: 'relative', touchAction: 'pan-y' }}
      onPointerMove={(event) => {
        if (event.pointerType === 'mouse') onHover(placeOf(event));
      }}
      onPointerLeave={() => onHover(null)}
      onClick={(event) => onTap(placeOf(event))}
    >
      {children}
    </div>
  );
}
