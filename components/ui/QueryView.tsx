import type { ReactNode } from 'react';
import { EmptyState, ErrorState, NoPermission, type MessageAction } from './Message';
import { Skeleton } from './Skeleton';

interface QueryViewProps<Data> {
  pending: boolean;
  /** What failed, in words; null when nothing did. */
  error: { title: string; text?: string } | null;
  /** The answer was "not allowed": who may and the way back. */
  forbidden?: { title: string; text?: string; action?: MessageAction } | null;
  data: Data | undefined;
  isEmpty?: (data: Data) => boolean;
  empty?: { title: string; text?: string; action?: MessageAction };
  skeleton?: ReactNode;
  onRetry?: () => void;
  children: (data: Data) => ReactNode;
}

/** A view in one of its states: loading, not allowed, failed, empty, or its content. */
export function QueryView<Data>({ pending, error, forbidden, data, isEmpty, empty, skeleton, onRetry, children }: QueryViewProps<Data>) {
  if (forbidden) return <NoPermission {...forbidden} />;
  if (data !== undefined) {
    if (empty && isEmpty?.(data)) return <EmptyState {...empty} />;
    return children(data);
  }
  if (pending) return skeleton ?? <Skeleton />;
  return <ErrorState title={error?.title ?? 'Nothing came.'} text={error?.text} onRetry={onRetry} />;
}
