import { Component, type ReactNode } from 'react';
import { ErrorState } from '../ui/Message';
import { TextLink } from '../ui/TextLink';
import { Screen } from './Screen';
import { startAgain } from './startAgain';

/** How the bundler's runtime names the failure of a part of the client that did not arrive. */
const PART_MISSING = 'AsyncRequireError';

interface PageBoundaryProps {
  path: string;
  children: ReactNode;
}

/** A page that failed says so and leaves the rest of the register at hand; going elsewhere clears it. */
export class PageBoundary extends Component<PageBoundaryProps, { error: Error | null }> {
  override state: { error: Error | null } = { error: null };

  static getDerivedStateFromError(error: unknown) {
    return { error: error instanceof Error ? error : new Error(String(error)) };
  }

  override componentDidCatch(error: unknown) {
    console.error('A page failed', error);
  }

  override componentDidUpdate(before: PageBoundaryProps) {
    if (before.path !== this.props.path && this.state.error !== null) this.setState({ error: null });
  }

  override render() {
    const { error } = this.state;
    if (error === null) return this.props.children;
    return <FailedPage missing={error.name === PART_MISSING} onRetry={() => startAgain(() => this.setState({ error: null }))} />;
  }
}

function FailedPage({ missing, onRetry }: { missing: boolean; onRetry: () => void }) {
  return (
    <Screen title={missing ? 'This page did not arrive' : 'This page failed'}>
      {missing ? (
        <ErrorState title="A part of this page could not be loaded." text="The connection may be down, or the register was renewed meanwhile." retryLabel="Load the page again" onRetry={onRetry} />
      ) : (
        <ErrorState title="Something in this page went wrong." text="It is the register's fault; what you sent is kept." retryLabel="Load the page again" onRetry={onRetry} />
      )}
      <TextLink href="/">To the register</TextLink>
    </Screen>
  );
}
