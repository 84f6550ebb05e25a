import type { CheckResult } from '../../../shared/contracts/checks';
import { unexplainedWarnings } from '../../../shared/domain/checks/outcome';
import { AppError } from '../../errors';

/**
 * Refuses what cannot be submitted: everything impossible, and every doubtful value without a word on it.
 *
 * @param explanations texts by `<code>@<path>`, or by `<code>` for all checks of a kind
 * @throws checks-block with one error per finding
 */
export function refuseUnlessSound(checks: readonly CheckResult[], explanations: Readonly<Record<string, string>>): void {
  const blocking = checks.filter((check) => check.level === 'blocks');
  const silent = unexplainedWarnings(checks, explanations);
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
