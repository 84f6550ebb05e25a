import type { CheckResult } from '../../shared/contracts/checks';
import { explanationKey } from '../../shared/domain/checks/outcome';
import type { CheckRow } from '../marks/CheckList';

const order = { blocks: 0, warns: 1, passes: 2 } as const;

/** Checks as rows of a check list: what blocks first, then what is doubtful with the contributor's word on it. */
export function checkRows(checks: readonly CheckResult[], explanations: Readonly<Record<string, string>> = {}): CheckRow[] {
  return [...checks]
    .sort((a, b) => order[a.level] - order[b.level])
    .map((check, index) => {
      const word = explanations[explanationKey(check)] ?? explanations[check.code];
      return {
        key: `${check.code}@${check.path}#${index}`,
        level: check.level,
        name: check.code.replaceAll('-', ' '),
        figure: check.figure ?? undefined,
        limit: check.limit ?? undefined,
        sentence: check.level === 'passes' ? undefined : `${check.message}${word ? ` The contributor says: “${word}”` : ''}`,
      };
    });
}
