import type { CheckResult } from '../../contracts/checks';

/**
 * Builds one check result. `figure` and `limit` are printed as they stand in a check list;
 * numbers are cut to three significant digits.
 */
export function outcome(
  level: CheckResult['level'],
  code: string,
  path: string,
  message: string,
  figure: number | string | null = null,
  limit: string | null = null,
): CheckResult {
  return { code, level, path, message, figure: typeof figure === 'number' ? shortFigure(figure) : figure, limit };
}

/** A number to three significant digits without trailing zeros or powers: 0.043, 2.3, 521. */
export function shortFigure(value: number): string {
  if (!Number.isFinite(value)) return 'not defined';
  if (value !== 0 && Math.abs(value) < 1e-4) return 'below 0.0001';
  return Math.abs(value) >= 1000 ? String(Math.round(value)) : String(Number(value.toPrecision(3)));
}

/** Key under which a contributor's word on a check is kept: code and field path, `few-aliquots@structures.0.samples.0.aliquots`. */
export function explanationKey(check: Pick<CheckResult, 'code' | 'path'>): string {
  return `${check.code}@${check.path}`;
}

/**
 * A contributor's word on a check, or null. `explanations` holds texts by `explanationKey`, or by the code alone for
 * every check of that kind. A word of blanks is none.
 */
export function wordOnCheck(check: Pick<CheckResult, 'code' | 'path'>, explanations: Readonly<Record<string, string>>): string | null {
  const held = [explanationKey(check), check.code].map((key) => (Object.hasOwn(explanations, key) ? (explanations[key] ?? '').trim() : ''));
  return held.find((text) => text !== '') ?? null;
}

/** The doubtful checks that still lack a word, see `wordOnCheck`. */
export function unexplainedWarnings(checks: readonly CheckResult[], explanations: Readonly<Record<string, string>>): CheckResult[] {
  return checks.filter((check) => check.level === 'warns' && wordOnCheck(check, explanations) === null);
}

/** Whether anything impossible was found: then the content cannot be submitted. */
export function hasBlocks(checks: readonly CheckResult[]): boolean {
  return checks.some((check) => check.level === 'blocks');
}

/** Drops the checks that do not apply. */
export function applicable(checks: readonly (CheckResult | null)[]): CheckResult[] {
  return checks.filter((check): check is CheckResult => check !== null);
}

/** Sorts by level, keeping the order within each. */
export function byLevel(checks: readonly CheckResult[]): CheckResult[] {
  return (['blocks', 'warns', 'passes'] as const).flatMap((level) => checks.filter((check) => check.level === level));
}
