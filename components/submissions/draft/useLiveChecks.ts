import { useEffect, useMemo, useState } from 'react';
import type { CheckResult } from '../../../shared/contracts/checks';
import type { SubmissionContent } from '../../../shared/contracts/content';
import type { Preview } from '../../../shared/contracts/submissions';
import { checkLiteratureContent } from '../../../shared/domain/checks/literatureContent';
import { byLevel } from '../../../shared/domain/checks/outcome';
import { checkSpecimenContent } from '../../../shared/domain/checks/specimenContent';
import { usePreview } from '../../queries/submissions';

const PAUSE_MS = 600;

function checkHere(content: SubmissionContent, today: string): CheckResult[] {
  return content.kind === 'specimen' ? checkSpecimenContent(content, { today }) : checkLiteratureContent(content, { today });
}

const placeOf = (check: CheckResult) => `${check.code}@${check.path}`;
const wholeOf = (check: CheckResult) => `${placeOf(check)}=${check.level}`;

/** What only the register can find: its checks of a content, less those that the form finds by itself. */
export function onlyTheRegisters(fromRegister: readonly CheckResult[], here: readonly CheckResult[]): CheckResult[] {
  const known = new Set(here.map(wholeOf));
  return fromRegister.filter((check) => !known.has(wholeOf(check)));
}

/** Checks found here, with those of the register in the place of their own kind at the same field. */
export function mergeChecks(here: readonly CheckResult[], registers: readonly CheckResult[]): CheckResult[] {
  const taken = new Set(registers.map(placeOf));
  return byLevel([...registers, ...here.filter((check) => !taken.has(placeOf(check)))]);
}

export interface LiveChecks {
  checks: CheckResult[];
  preview: Preview | null;
  /** The register is computing, or the newest typing has not reached it yet. */
  pending: boolean;
  failed: boolean;
}

/** Checks as one types, and after a pause what only the register knows: other specimens, the clade's line. */
export function useLiveChecks(content: SubmissionContent, submissionId: string): LiveChecks {
  const [today] = useState(() => new Date().toISOString().slice(0, 10));
  const [settled, setSettled] = useState(content);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(content), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [content]);
  const { data, isFetching, isError } = usePreview(settled, submissionId);
  const here = useMemo(() => checkHere(content, today), [content, today]);
  const registers = useMemo(() => (data?.content ? onlyTheRegisters(data.preview.checks, checkHere(data.content, today)) : []), [data, today]);
  const checks = useMemo(() => mergeChecks(here, registers), [here, registers]);
  return { checks, preview: data?.preview ?? null, pending: isFetching || settled !== content, failed: isError };
}
