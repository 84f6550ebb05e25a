import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { ScalingFigure, type ScalingFigureProps } from '../../components/charts/ScalingFigure';
import type { FigureGroup } from '../../components/charts/figureTypes';
import { ThemeProvider } from '../../components/theme/ThemeProvider';

const fit = { exponent: 1, log10Coefficient: -8, residualSd: 0.1, n: 4, meanLog10X: 8.5, sxx: 2, tCritical: 4.303, xRange: { lower: 1e8, upper: 1e9 } };
const point = (id: string, x: number, y: number, more: Partial<FigureGroup['points'][number]> = {}) => ({ id, label: `Speciosus ${id}`, x, y, flag: false, setAside: false, href: null, ...more });
const groups: FigureGroup[] = [
  { key: 'primates', label: 'Primates', fit, points: [point('alpha', 1e8, 1), point('beta', 3e8, 3.1), point('gamma', 1e9, 9.8)] },
  { key: 'rodentia', label: 'Rodentia', fit: null, points: [point('delta', 2e8, 9, { flag: true, note: 'flagged, t = 5.8' }), point('epsilon', 4e8, 5, { setAside: true })] },
];

function show(props: Partial<ScalingFigureProps> = {}) {
  const figure = (
    <ThemeProvider>
      <ScalingFigure
        title="Mass of the cerebral cortex on its neurons"
        x={{ label: 'neurons in the cerebral cortex', unit: null, tone: 'neurons', variable: 'neurons', kind: 'count' }}
        y={{ label: 'mass of the cerebral cortex', unit: 'g', tone: 'mass', variable: 'structureMassG', kind: 'mass' }}
        groups={groups}
        showConfidence
        showPrediction={false}
        diagonals="per-mg"
        selectedId={null}
        onSelect={() => {}}
        width={530}
        {...props}
      />
    </ThemeProvider>
  );
  return render(figure);
}

describe('the scaling figure', () => {
  it('names every point with its clade, its state and both values', () => {
    show();
    const names = screen.getAllByRole('img').map((mark) => mark.getAttribute('aria-label'));
    expect(names).toHaveLength(5);
    expect(names).toContain('Speciosus beta, Primates: mass of the cerebral cortex 3.1 g, neurons in the cerebral cortex 3 × 10⁸');
    expect(names.find((name) => name?.includes('delta'))).toContain('flagged, t = 5.8');
    expect(names.find((name) => name?.includes('epsilon'))).toContain('set aside');
  });

  it('is one stop of the keyboard; arrows go along the clade and to the next, Enter selects', () => {
    const onSelect = vi.fn();
    show({ onSelect });
    const stops = screen.getAllByRole('img').filter((mark) => mark.getAttribute('tabindex') === '0');
    expect(stops).toHaveLength(1);
    const first = stops[0];
    if (!first) throw new Error('no point can be reached');
    fireEvent.keyDown(first, { key: 'ArrowRight' });
    expect(document.activeElement?.getAttribute('aria-label')).toContain('beta');
    if (document.activeElement) fireEvent.keyDown(document.activeElement, { key: 'ArrowDown' });
    expect(document.activeElement?.getAttribute('aria-label')).toMatch(/delta|epsilon/);
    if (document.activeElement) fireEvent.keyDown(document.activeElement, { key: 'Enter' });
    expect(onSelect).toHaveBeenCalledOnce();
  });

  it('draws set-aside points hollow and a line only where a fit is stored', () => {
    const { container } = show();
    const hollow = screen.getAllByRole('img').find((mark) => mark.getAttribute('aria-label')?.includes('epsilon'));
    const solid = screen.getAllByRole('img').find((mark) => mark.getAttribute('aria-label')?.includes('delta'));
    expect(hollow?.getAttribute('fill')).toBe('#FFFFFF');
    expect(solid?.getAttribute('fill')).toBe('#733F0B');
    const lines = [...container.querySelectorAll('path')].filter((path) => path.style.strokeWidth === '1.8' || path.getAttribute('style')?.includes('stroke-width: 1.8'));
    expect(lines).toHaveLength(1);
  });

  it('reverses the selected point’s values out on both axes', () => {
    show({ selectedId: 'beta' });
    expect(screen.getByText('3.1 g')).toBeInTheDocument();
    expect(screen.getByText('3 × 10⁸')).toBeInTheDocument();
  });

  it('shows a prediction band only on demand', () => {
    const bands = (container: HTMLElement) => [...container.querySelectorAll('path')].filter((path) => path.getAttribute('style')?.includes('fill-opacity')).length;
    const without = bands(show().container);
    const withBand = bands(show({ showPrediction: true }).container);
    expect(without).toBe(1);
    expect(withBand).toBe(2);
  });
});
