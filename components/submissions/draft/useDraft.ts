import { useEffect, useState, useSyncExternalStore } from 'react';
import type { SubmissionDetail } from '../../../shared/contracts/submissions';
import { useReloadSubmission, useSaveDraft } from '../../queries/submissions';
import { DraftSaver } from './DraftSaver';

/** The draft as it is being typed, where it is kept, and the acts on both. One for each submission on the screen. */
export function useDraft(detail: SubmissionDetail) {
  const { mutateAsync: send } = useSaveDraft(detail.id);
  const reload = useReloadSubmission(detail.id);
  const [saver] = useState(() => new DraftSaver(detail, { send, reload }));
  const snapshot = useSyncExternalStore(saver.subscribe, saver.getSnapshot, saver.getSnapshot);
  useEffect(() => {
    saver.start();
    globalThis.addEventListener?.('online', saver.retry);
    return () => {
      globalThis.removeEventListener?.('online', saver.retry);
      saver.stop();
    };
  }, [saver]);
  useEffect(() => saver.adopt(detail), [saver, detail]);
  return { ...snapshot, saver };
}
