import { createContext, useContext } from 'react';
import type { CheckResult } from '../../../shared/contracts/checks';
import type { SubmissionContent } from '../../../shared/contracts/content';
import type { CommentView } from '../../../shared/contracts/submissions';

export interface DraftContextValue {
  submissionId: string;
  content: SubmissionContent;
  /** Everything found so far: here as one types, by the register after a pause. */
  checks: readonly CheckResult[];
  /** What the register said at a field when it refused to take the draft. */
  refused: readonly { path: string; message: string }[];
  /** After the first try to submit, what is missing is said at its field too. */
  tried: boolean;
  comments: readonly CommentView[];
}

export const DraftContext = createContext<DraftContextValue | null>(null);

export function useDraftContext(): DraftContextValue {
  const value = useContext(DraftContext);
  if (value === null) throw new Error('A field of a draft needs the draft above it');
  return value;
}

/** What is wrong or doubtful at a field, in words. What is merely not filled in yet is quiet until one tried to submit. */
export function useFieldChecks(path: string): { error?: string; warning?: string } {
  const { checks, tried, refused } = useDraftContext();
  const here = checks.filter((check) => check.path === path);
  const error = here.find((check) => check.level === 'blocks' && (tried || check.code !== 'missing'))?.message ?? refused.find((found) => found.path === path)?.message;
  const warning = here.find((check) => check.level === 'warns')?.message;
  return { ...(error === undefined ? null : { error }), ...(warning === undefined ? null : { warning }) };
}
