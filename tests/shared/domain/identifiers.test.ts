import { describe, expect, it } from 'vitest';
import { parseDoi, parseOrcid, parseRrid, recordNumber, recordSerial, speciesSlug } from '../../../shared/domain/identifiers';

describe('a DOI', () => {
  it.each([
    ['10.1523/JNEUROSCI.4526-04.2005', '10.1523/jneurosci.4526-04.2005'],
    ['https://doi.org/10.1126/science.982039', '10.1126/science.982039'],
    ['doi:10.1159/000437413', '10.1159/000437413'],
    ['10.5072/allokarya.v2', '10.5072/allokarya.v2'],
  ])('is read from %s', (text, expected) => expect(parseDoi(text)).toBe(expected));

  it.each(['', '10.1523', '10.1523/', '11.1523/x', 'doi.org/10', '10.1/x', '10.1126/sci ence', '10.1126/<script>', 'https://example.org/10.1126/x'])(
    'is refused in %j',
    (text) => expect(parseDoi(text)).toBeNull(),
  );
});

describe('an ORCID iD', () => {
  // The iDs of ORCID's own documentation, one of them with check character X.
  it.each(['0000-0002-1825-0097', '0000-0001-5109-3700', '0000-0002-1694-233X', 'https://orcid.org/0000-0002-1694-233x'])('is read from %s', (text) => {
    expect(parseOrcid(text)).toMatch(/^\d{4}-\d{4}-\d{4}-\d{3}[\dX]$/);
  });

  it.each(['0000-0002-1825-0098', '0000-0002-1852-0097', '0000000218250097', '0000-0002-1825-009', '', '0000-0002-1694-2330'])('is refused in %j', (text) => {
    expect(parseOrcid(text)).toBeNull();
  });
});

describe('a research resource identifier', () => {
  it('is read with and without its prefix, and refused without its number', () => {
    expect(parseRrid('AB_2298772')).toBe('RRID:AB_2298772');
    expect(parseRrid('RRID: AB_2298772')).toBe('RRID:AB_2298772');
    expect(parseRrid('MAB377')).toBeNull();
    expect(parseRrid('RRID:')).toBeNull();
  });
});

describe('the address of a species', () => {
  it.each([
    ['Rattus norvegicus', 'rattus-norvegicus'],
    ['Cynomys sp.', 'cynomys-sp'],
    ['  Equus  asinus × caballus ', 'equus-asinus-x-caballus'],
    ['Müllerornis agilis', 'mullerornis-agilis'],
    ['Aus "bus"/../', 'aus-bus'],
  ])('of %s is %s', (name, slug) => expect(speciesSlug(name)).toBe(slug));

  it('is none where no letter is left', () => {
    expect(speciesSlug('')).toBeNull();
    expect(speciesSlug('?? 12')).toBeNull();
  });
});

describe('the number of a record', () => {
  it('has six digits and reads back', () => {
    expect(recordNumber(123)).toBe('AK-000123');
    expect(recordNumber(999_999)).toBe('AK-999999');
    expect(recordSerial('ak-000123')).toBe(123);
    expect(recordSerial('AK-000000')).toBeNull();
    expect(recordSerial('AK-123')).toBeNull();
  });

  it.each([0, -1, 1.5, 1_000_000, NaN])('refuses %d', (serial) => expect(() => recordNumber(serial)).toThrow(RangeError));
});
