import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { FailedApp } from '../../components/layout/FailedApp';
import { PageBoundary } from '../../components/layout/PageBoundary';
import { ThemeProvider } from '../../components/theme/ThemeProvider';

function Broken({ error }: { error: Error }): never {
  throw error;
}

function framed(path: string, page: React.ReactNode) {
  return (
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { enabled: false } } })}>
      <ThemeProvider>
        <PageBoundary path={path}>{page}</PageBoundary>
      </ThemeProvider>
    </QueryClientProvider>
  );
}

describe('a page that fails', () => {
  beforeEach(() => {
    // React and the boundary report what they caught; here it is expected.
    vi.spyOn(console, 'error').mockImplementation(() => {});
  });
  afterEach(() => vi.restoreAllMocks());

  it('says so and leads back to the register', () => {
    render(framed('/species', <Broken error={new Error('x is undefined')} />));
    expect(screen.getByRole('heading', { name: 'This page failed' })).toBeVisible();
    expect(screen.getByRole('alert')).toHaveTextContent('Something in this page went wrong.');
    expect(screen.getByRole('link', { name: 'To the register' })).toHaveAttribute('href', '/');
  });

  it('offers to load the page again when a part of it did not arrive', () => {
    const missing = Object.assign(new Error('Loading module failed'), { name: 'AsyncRequireError' });
    render(framed('/bench', <Broken error={missing} />));
    expect(screen.getByRole('alert')).toHaveTextContent('A part of this page could not be loaded.');
    expect(screen.getByRole('button', { name: 'Load the page again' })).toBeEnabled();
  });

  it('is left behind by going elsewhere', () => {
    const { rerender } = render(framed('/species', <Broken error={new Error('x is undefined')} />));
    rerender(framed('/versions', <p>Versions</p>));
    expect(screen.getByText('Versions')).toBeVisible();
    expect(screen.queryByRole('alert')).toBeNull();
  });

  it('can be tried again even where the frame itself failed', async () => {
    const retry = vi.fn(async () => {});
    render(<FailedApp error={new Error('x is undefined')} retry={retry} />);
    expect(screen.getByRole('alert')).toHaveTextContent('Allokarya could not be shown.');
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(retry).toHaveBeenCalledOnce();
  });
});
