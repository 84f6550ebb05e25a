import type { CheckResult } from '../../contracts/checks';
import { parseDoi, parseOrcid, parseRrid } from '../identifiers';
import { outcome } from './outcome';

/** A DOI that stands in a field is well formed; an empty field is passed over. */
export function checkDoi(text: string, path: string): CheckResult | null {
  if (text.trim() === '' || parseDoi(text) !== null) return null;
  return outcome('blocks', 'doi-malformed', path, 'A DOI begins with 10. and a registrant’s number, then a slash and a suffix.', text.trim().slice(0, 80), '10.1234/suffix');
}

/** An ORCID iD is well formed, its check character included; an empty field is passed over. */
export function checkOrcid(text: string, path: string): CheckResult | null {
  if (text.trim() === '' || parseOrcid(text) !== null) return null;
  return outcome('blocks', 'orcid-malformed', path, 'An ORCID iD has four groups of four characters, and its last one checks the others: one of them is wrong.', text.trim().slice(0, 80), '0000-0000-0000-000X');
}

/** An antibody's identifier has the form of an RRID; optional, so only doubtful. */
export function checkRrid(text: string, path: string): CheckResult | null {
  if (text.trim() === '' || parseRrid(text) !== null) return null;
  return outcome('warns', 'rrid-malformed', path, 'An antibody’s RRID reads RRID:AB_ and a number.', text.trim().slice(0, 80), 'RRID:AB_2298772');
}

/** The code is not that of another animal of the lab; capitals and blanks at the ends make no difference. */
export function checkSpecimenCode(code: string, labSpecimenCodes: readonly string[], path: string): CheckResult | null {
  const plain = (text: string) => text.trim().toLowerCase();
  if (plain(code) === '') return null;
  const isTaken = labSpecimenCodes.some((other) => plain(other) === plain(code));
  return isTaken
    ? outcome('blocks', 'specimen-code-taken', path, 'Another animal of this lab carries the same specimen code.', code.trim(), 'one animal, one code')
    : null;
}
