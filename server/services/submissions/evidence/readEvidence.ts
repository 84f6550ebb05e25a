import { fileTypeFromBuffer } from 'file-type';
import Papa from 'papaparse';
import type { attachmentTypes } from '../../../../shared/contracts/vocabulary';
import { AppError } from '../../../errors';
import { stripJpeg } from './stripJpeg';
import { stripPng } from './stripPng';
import { stripTiff } from './stripTiff';

export type EvidenceType = (typeof attachmentTypes)[number];

/** Rows looked at; the text as a whole is checked for what no table holds. */
const rowsRead = 1000;

/** Whether bytes are a table in text: UTF-8 without control characters, two columns or more, the same in each row. */
function isTable(bytes: Buffer): boolean {
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return false;
  }
  // Scripts and pages are text as well, and never evidence.
  if (/(?![\t\n\r])\p{Cc}/u.test(text) || /^\s*(#!|<|%!|@echo)/i.test(text)) return false;
  const { data, errors } = Papa.parse<string[]>(text, { preview: rowsRead, skipEmptyLines: 'greedy' });
  const columns = data[0]?.length ?? 0;
  return columns >= 2 && errors.length === 0 && data.every((row) => row.length === columns);
}

async function typeOf(bytes: Buffer): Promise<EvidenceType | null> {
  switch ((await fileTypeFromBuffer(bytes))?.mime) {
    case 'application/pdf':
      return 'application/pdf';
    case 'image/png':
    case 'image/apng':
      return 'image/png';
    case 'image/jpeg':
      return 'image/jpeg';
    case 'image/tiff':
      return 'image/tiff';
    default:
      return isTable(bytes) ? 'text/csv' : null;
  }
}

const strips: Partial<Record<EvidenceType, (bytes: Buffer) => Buffer | null>> = { 'image/jpeg': stripJpeg, 'image/png': stripPng, 'image/tiff': stripTiff };

/**
 * What is kept of an uploaded file: its type by its content, whatever it is called, and its bytes without location
 * data (lossless: image data stay as they are).
 * @throws unsupported-type for anything but PDF, PNG, JPEG, TIFF and CSV, and for images that cannot be read
 */
export async function readEvidence(bytes: Buffer): Promise<{ mediaType: EvidenceType; bytes: Buffer }> {
  const mediaType = await typeOf(bytes);
  if (mediaType === null) throw new AppError('unsupported-type', 'Evidence is a PDF, PNG, JPEG, TIFF or CSV file; this is none by its content, whatever it is called.');
  const strip = strips[mediaType];
  const kept = strip === undefined ? bytes : strip(bytes);
  if (kept === null) throw new AppError('unsupported-type', 'The image is cut off or damaged, so that its location data cannot be taken out.');
  return { mediaType, bytes: kept };
}
