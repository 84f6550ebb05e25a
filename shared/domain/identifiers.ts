/**
 * A DOI in its bare lower-case form, or null where it is malformed. Accepts "doi:" and the address forms
 * of doi.org. Form: 10., four to nine digits, a slash and a suffix without blanks (DOI Handbook 2.2).
 */
export function parseDoi(text: string): string | null {
  const bare = text.trim().replace(/^(https?:\/\/(dx\.)?doi\.org\/|doi:\s*)/i, '');
  // Quotes, angle brackets and backslashes occur in no registered form we cite, and would leave the address.
  return /^10\.\d{4,9}(\.\d+)*\/[^\s"<>\\]+$/.test(bare) ? bare.toLowerCase() : null;
}

/**
 * An ORCID iD as 0000-0000-0000-000X, or null where its form or its check character is wrong.
 * Check character: ISO/IEC 7064 MOD 11-2. Accepts the address form at orcid.org.
 */
export function parseOrcid(text: string): string | null {
  const bare = text.trim().replace(/^https?:\/\/orcid\.org\//i, '').toUpperCase();
  if (!/^\d{4}-\d{4}-\d{4}-\d{3}[\dX]$/.test(bare)) return null;
  const characters = bare.replace(/-/g, '');
  let total = 0;
  for (const digit of characters.slice(0, 15)) total = (total + Number(digit)) * 2;
  const remainder = (12 - (total % 11)) % 11;
  return characters.charAt(15) === (remainder === 10 ? 'X' : String(remainder)) ? bare : null;
}

/** A research resource identifier as RRID:AB_2298772, or null where it is malformed; the prefix may be missing. */
export function parseRrid(text: string): string | null {
  const match = /^(?:RRID:\s*)?([A-Z]+_[A-Za-z0-9:_-]+)$/i.exec(text.trim());
  const identifier = match?.[1];
  return identifier === undefined ? null : `RRID:${identifier}`;
}

/**
 * Address of a species: binomial in lower case with hyphens ("Rattus norvegicus" → "rattus-norvegicus",
 * "Cynomys sp." → "cynomys-sp"). Accents are dropped, the sign of a hybrid becomes x. Null for a name
 * that holds no letter.
 */
export function speciesSlug(name: string): string | null {
  const slug = name
    .normalize('NFD')
    .replace(/[\u0300-\u036f]/g, '')
    .replace(/×/g, ' x ')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '');
  return /[a-z]/.test(slug) ? slug : null;
}

/** The number of a record as printed, AK- and six digits. Throws RangeError outside 1…999999. */
export function recordNumber(serial: number): string {
  if (!Number.isInteger(serial) || serial < 1 || serial > 999_999) throw new RangeError(`A record's serial is a whole number from 1 to 999999, not ${serial}.`);
  return `AK-${String(serial).padStart(6, '0')}`;
}

/** The serial of a printed record number, or null where it is none. */
export function recordSerial(text: string): number | null {
  const match = /^AK-(\d{6})$/.exec(text.trim().toUpperCase());
  const serial = Number(match?.[1]);
  return match !== null && serial > 0 ? serial : null;
}

/**
 * Whether a name is kept at genus level ("Cynomys sp."): it stands for one species that nobody named and enters fits
 * with a mark; a name that fits several species never does.
 */
export const isGenusLevel = (name: string): boolean => name.endsWith(' sp.');
