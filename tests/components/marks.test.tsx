import { fireEvent, render, screen } from '@testing-library/react';
import { createEvent } from '@testing-library/dom';
import type { ReactElement } from 'react';
import { describe, expect, it } from 'vitest';
import { CheckList } from '../../components/marks/CheckList';
import { PlaceOnLine } from '../../components/marks/PlaceOnLine';
import { stripPosition } from '../../components/marks/placeOnLineGeometry';
import { Quantity } from '../../components/marks/Quantity';
import { shareRibbons } from '../../components/marks/shareRibbons';
import { StateSign } from '../../components/marks/StateSign';
import { assignCladeMarks, cladeMark } from '../../components/theme/cladeMarks';
import { ThemeProvider } from '../../components/theme/ThemeProvider';
import { placeOfPath, placesFor, spokenPlace } from '../../components/layout/places';

function show(element: ReactElement) {
  return render(<ThemeProvider>{element}</ThemeProvider>);
}

describe('a quantity', () => {
  it('prints value and error to the error’s digits and is copied as the plain number', () => {
    const { container } = show(<Quantity value={1.285e8} error={6.2e6} kind="count" tone="neurons" />);
    expect(container).toHaveTextContent('(1.29 ± 0.06) × 10⁸');
    const number = container.querySelector('span');
    if (!number) throw new Error('the quantity is not in the page');
    let copied = '';
    const copy = createEvent.copy(number, { clipboardData: { setData: (_type: string, data: string) => (copied = data) } });
    fireEvent(number, copy);
    expect(copied).toMatch(/^\d+$/);
    expect(Number(copied)).toBe(129000000);
  });

  it('says that there is none rather than print a zero', () => {
    const { container } = show(<Quantity value={null} kind="mass" unit="g" missing="not weighed" />);
    expect(container).toHaveTextContent('not weighed');
  });
});

describe('a place on the line', () => {
  it('says ratio and interval in words, also where the drawing is dense', () => {
    show(<PlaceOnLine clade="primates" dense width={150} place={{ ratio: 1.2, lower: 0.6, upper: 1.7 }} />);
    expect(screen.getByRole('img', { name: '1.2 times the line; inside the 95 % prediction interval' })).toBeInTheDocument();
  });

  it('stands in the middle at the line itself and at the ends beyond the scale', () => {
    expect(stripPosition(1, 6)).toEqual({ at: 0.5, beyond: false });
    expect(stripPosition(6, 6).at).toBeCloseTo(1, 12);
    expect(stripPosition(1 / 9, 6)).toEqual({ at: 0, beyond: true });
  });
});

describe('signs', () => {
  it('a state has its word', () => {
    show(<StateSign state="changes-requested" />);
    expect(screen.getByText('changes requested')).toBeInTheDocument();
  });

  it('a check says whether it passes, with figure and limit', () => {
    show(<CheckList checks={[{ key: 'a', level: 'warns', name: 'half of the line?', figure: '0.51', limit: 'not 0.5', sentence: 'One hemisphere, not doubled?' }]} />);
    const item = screen.getByRole('listitem');
    for (const words of ['doubtful', 'half of the line?', '0.51', 'not 0.5', 'One hemisphere, not doubled?']) expect(item).toHaveTextContent(words);
  });
});

describe('clade marks', () => {
  it('a clade keeps its mark by slug, name or path', () => {
    expect(cladeMark('rodentia').shape).toBe('disc');
    expect(cladeMark('Mammalia/Euarchontoglires/Primates').shape).toBe('square');
    expect(cladeMark('someneworder')).toBe(cladeMark('SomeNewOrder'));
  });

  it('clades shown together never share a mark while there are enough', () => {
    const clades = ['glires', 'scandentia', 'lagomorpha', 'marsupialia', 'psittaciformes', 'eulipotyphla', 'chiroptera', 'primates'];
    const marks = assignCladeMarks(clades);
    expect(new Set([...marks.values()].map((mark) => mark.shape)).size).toBe(8);
  });
});

describe('the ribbon of shares', () => {
  it('fills both bars from end to end with gaps between the parts', () => {
    const ribbons = shareRibbons(
      [
        { key: 'a', label: 'cerebral cortex', massShare: 0.6, neuronShare: 0.2 },
        { key: 'b', label: 'cerebellum', massShare: 0.4, neuronShare: 0.8 },
      ],
      { width: 103, top: 0, bottom: 100, gap: 3 },
    );
    expect(ribbons.map((ribbon) => [ribbon.top, ribbon.bottom])).toEqual([
      [{ from: 0, to: 60 }, { from: 0, to: 20 }],
      [{ from: 63, to: 103 }, { from: 23, to: 103 }],
    ]);
  });
});

describe('places', () => {
  it('are four without an account and five with a role', () => {
    expect(placesFor({ roles: [], waiting: {} }).map((place) => place.label)).toEqual(['Register', 'Scaling', 'Bench', 'Versions']);
    expect(placesFor({ roles: ['reviewer'], waiting: { review: 5 } })[3]).toMatchObject({ label: 'Review', waiting: 5 });
  });

  it('who holds several roles gets one desk with all that waits', () => {
    const desk = placesFor({ roles: ['contributor', 'reviewer', 'curator'], waiting: { submissions: 1, review: 2, curate: 3 } })[3];
    expect(desk).toMatchObject({ label: 'Desk', waiting: 6 });
    expect(desk && spokenPlace(desk)).toBe('Desk, 6 waiting');
  });

  it('an address belongs to its place, or to none', () => {
    const places = placesFor({ roles: ['contributor'], waiting: {} });
    expect(placeOfPath(places, '/species/speciosus-inventus')).toBe(0);
    expect(placeOfPath(places, '/scaling')).toBe(1);
    expect(placeOfPath(places, '/sign-in')).toBeNull();
  });
});
