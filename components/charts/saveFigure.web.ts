import { Asset } from 'expo-asset';
import { fontFiles } from '../theme/fonts';
import { registeredFamily, type FontName } from '../theme/fontNames';
import { composeFigureSvg, facesIn } from './figureSvg';
import type { SaveFigureRequest } from './saveFigure';

export const canSaveFigure = true;

const PNG_SCALE = 2;

async function fontFace(name: FontName): Promise<string> {
  const { uri } = Asset.fromModule(fontFiles[name]);
  const answer = await fetch(uri);
  if (!answer.ok) throw new Error(`The font ${registeredFamily[name]} did not arrive.`);
  const bytes = new Uint8Array(await answer.arrayBuffer());
  let binary = '';
  // In pieces: a call with all bytes as arguments exceeds the stack.
  for (let start = 0; start < bytes.length; start += 0x8000) binary += String.fromCharCode(...bytes.subarray(start, start + 0x8000));
  return `@font-face{font-family:"${registeredFamily[name]}";src:url(data:font/ttf;base64,${btoa(binary)}) format("truetype");}`;
}

/** The drawing without what only lives in a page: focus stops, roles and ids of its points. */
function serialise(drawing: SVGSVGElement): string {
  const copy = drawing.cloneNode(true) as SVGSVGElement;
  for (const element of copy.querySelectorAll('[tabindex], [id], [role]')) {
    for (const attribute of ['tabindex', 'role', 'aria-hidden']) element.removeAttribute(attribute);
    if (element.closest('defs') === null) element.removeAttribute('id');
  }
  return new XMLSerializer().serializeToString(copy);
}

function download(blob: Blob, fileName: string): void {
  const address = URL.createObjectURL(blob);
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}

async function toPng(svg: string, width: number, height: number): Promise<Blob> {
  const image = new Image();
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(svg)}`;
  await image.decode();
  const canvas = document.createElement('canvas');
  canvas.width = width * PNG_SCALE;
  canvas.height = height * PNG_SCALE;
  const context = canvas.getContext('2d');
  if (!context) throw new Error('This browser has no canvas to draw on.');
  context.scale(PNG_SCALE, PNG_SCALE);
  context.drawImage(image, 0, 0);
  const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/png'));
  if (!blob) throw new Error('The picture could not be made.');
  return blob;
}

/** Saves the figure with title, caption and citation inside, fonts embedded; PNG at twice the size. */
export async function saveFigure({ elementId, format, fileName, caption, colours }: SaveFigureRequest): Promise<void> {
  const drawing = document.getElementById(elementId)?.querySelector<SVGSVGElement>('svg');
  if (!drawing) throw new Error('There is no figure to save.');
  const text = serialise(drawing);
  const faces = await Promise.all(facesIn(text).map(fontFace));
  const size = { width: drawing.width.baseVal.value, height: drawing.height.baseVal.value };
  const { svg, width, height } = composeFigureSvg(text, size, caption, colours, faces.join('\n'));
  const blob = format === 'svg' ? new Blob([svg], { type: 'image/svg+xml' }) : await toPng(svg, width, height);
  download(blob, `${fileName}.${format}`);
}
