import type { FigureCaption, FigureColours } from './figureSvg';

export interface SaveFigureRequest {
  /** `elementId` of the figure. */
  elementId: string;
  format: 'svg' | 'png';
  /** Without extension. */
  fileName: string;
  caption: FigureCaption;
  colours: FigureColours;
}

/** Native builds have no file download; the saved figure is the web's. */
export const canSaveFigure = false;

export async function saveFigure(_request: SaveFigureRequest): Promise<void> {
  throw new Error('Saving a figure needs the web version.');
}
