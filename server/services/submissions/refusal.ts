import type { CheckResult } from '../../../shared/contracts/checks';
import { AppError } from '../../errors';

/** A contributor's word on a doubtful check stands under code and path, or under the code for all of its kind. */
function isExplained(check: CheckResult, explanations: Readonly<Record<string, string>>): boolean {
  return [`${check.code}:${check.path}`, `${check.code}@${check.path}`, check.code].some((key) => Object.hasOwn(explanations, key) && (explanations[key] ?? '').trim() !== '');
}

/**
 * Refuses what cannot be submitted: everything impossible, and every doubtful value without a word on it.
 *
 * @param explanations texts by `<code>@<path>`, `<code>:<path>` or `<code>`
 * @throws checks-block with one error per finding
 */
export function refuseUnlessSound(checks: readonly CheckResult[], explanations: Readonly<Record<string, string>>): void {
  const blocking = checks.filter((check) => check.level === 'blocks');
  const silent = checks.filter((check) => check.level === 'warns' && !isExplained(check, explanations));
  if (blocking.length + silent.length === 0) return;
  const found = (check: CheckResult) => (check.figure === null ? '' : `; found ${check.figure}${check.limit === null ? '' : `, expected ${check.limit}`}`);
  const errors = [
    ...blocking.map((check) => ({ path: check.path, message: `${check.message}${found(check)}` })),
    ...silent.map((check) => ({ path: check.path, message: `${check.message}${found(check)}. Say why in a word.` })),
  ];
  const parts = [
    ...(blocking.length > 0 ? [`${blocking.length} ${blocking.length === 1 ? 'entry is' : 'entries are'} missing or impossible`] : []),
    ...(silent.length > 0 ? [`${silent.length} doubtful ${silent.length === 1 ? 'value needs' : 'values need'} a word`] : []),
  ];
  throw new AppError('checks-block', `${parts.join(', ')}.`, { errors, extra: { checks: [...blocking, ...silent] } });
}
