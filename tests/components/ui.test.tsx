import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState, type ReactElement } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { ThemeProvider } from '../../components/theme/ThemeProvider';
import { Button } from '../../components/ui/Button';
import { Checkbox } from '../../components/ui/Checkbox';
import { QueryView } from '../../components/ui/QueryView';
import { SegmentedChoice } from '../../components/ui/SegmentedChoice';
import { Select } from '../../components/ui/Select';
import { Table } from '../../components/ui/Table';
import { NumberField } from '../../components/ui/TextField';

function show(element: ReactElement) {
  return render(<ThemeProvider>{element}</ThemeProvider>);
}

describe('a field', () => {
  it('is found by its label and tells its error to a screen reader', () => {
    show(<NumberField label="nuclei, aliquot 3" tone="cells" value="39.5" onChangeText={() => {}} error="Counts are whole numbers." hint="of one chamber load" />);
    const field = screen.getByLabelText('nuclei, aliquot 3');
    expect(field).toHaveValue('39.5');
    expect(field).toHaveAttribute('aria-invalid', 'true');
    expect(field).toHaveAccessibleDescription('Counts are whole numbers. of one chamber load');
  });

  it('hands on what is typed, as typed', async () => {
    const typed = vi.fn();
    show(<NumberField label="tissue mass" value="" onChangeText={typed} />);
    await userEvent.type(screen.getByLabelText('tissue mass'), '5');
    expect(typed).toHaveBeenCalledWith('5');
  });

  it('is a real select where one of several is chosen', async () => {
    const chosen = vi.fn();
    show(<Select label="structure" value="cerebellum" options={[{ value: 'cerebellum', label: 'cerebellum' }, { value: 'cerebral_cortex', label: 'cerebral cortex' }]} onChange={chosen} />);
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'structure' }), 'cerebral cortex');
    expect(chosen).toHaveBeenCalledWith('cerebral_cortex');
  });
});

describe('a choice', () => {
  function Sides() {
    const [side, setSide] = useState<'left' | 'right' | 'both'>('left');
    return <SegmentedChoice label="hemispheres counted" value={side} onChange={setSide} options={[{ value: 'left', label: 'left' }, { value: 'right', label: 'right' }, { value: 'both', label: 'both' }]} />;
  }

  it('is one stop of the keyboard and moves with the arrow keys', async () => {
    show(<Sides />);
    await userEvent.tab();
    expect(screen.getByRole('radio', { name: 'left' })).toHaveFocus();
    await userEvent.keyboard('{ArrowRight}');
    expect(screen.getByRole('radio', { name: 'right' })).toBeChecked();
    expect(screen.getByRole('radio', { name: 'right' })).toHaveFocus();
    await userEvent.keyboard('{End}{ArrowRight}');
    expect(screen.getByRole('radio', { name: 'left' })).toBeChecked();
  });

  it('a box says its count and turns on', async () => {
    const change = vi.fn();
    show(<Checkbox label="Rodentia" end="18" checked={false} onChange={change} />);
    await userEvent.click(screen.getByRole('checkbox', { name: 'Rodentia, 18' }));
    expect(change).toHaveBeenCalledWith(true);
  });
});

describe('a button', () => {
  it('does nothing while it works and says that it does', async () => {
    const press = vi.fn();
    show(<Button label="Fit" working workingLabel="Fitting" onPress={press} />);
    const button = screen.getByRole('button', { name: 'Fitting' });
    expect(button).toHaveAttribute('aria-busy', 'true');
    await userEvent.click(button);
    expect(press).not.toHaveBeenCalled();
  });
});

describe('a table', () => {
  const columns = [
    { key: 'name', head: 'record', cell: (item: { id: string; neurons: number }) => item.id },
    { key: 'neurons', head: 'neurons', align: 'end' as const, cell: (item: { neurons: number }) => item.neurons },
  ];
  const items = [{ id: 'AK-000001', neurons: 3 }, { id: 'AK-000002', neurons: 5 }];

  it('has rows with a head cell that links and cells under column heads', () => {
    show(<Table caption="Records" rows={items} columns={columns} rowKey={(item) => item.id} rowHref={(item) => `/records/${item.id}` as '/'} phoneLayout="table" />);
    const table = screen.getByRole('table', { name: 'Records' });
    expect(within(table).getAllByRole('columnheader').map((head) => head.textContent)).toEqual(['record', 'neurons']);
    expect(within(table).getByRole('rowheader', { name: 'AK-000002' })).toBeInTheDocument();
    expect(within(table).getByRole('link', { name: 'AK-000001' })).toHaveAttribute('href', '/records/AK-000001');
  });
});

describe('a view of a query', () => {
  const view = (state: { pending: boolean; error: { title: string } | null; data: string[] | undefined }, retry = () => {}) => (
    <QueryView {...state} onRetry={retry} isEmpty={(data) => data.length === 0} empty={{ title: 'No samples yet.' }}>
      {(data) => <p>{data.join(' ')}</p>}
    </QueryView>
  );

  it('says that it loads', () => {
    show(view({ pending: true, error: null, data: undefined }));
    expect(screen.getByRole('status')).toHaveTextContent('Loading');
  });

  it('says what failed and tries again', async () => {
    const retry = vi.fn();
    show(view({ pending: false, error: { title: 'The fit did not arrive.' }, data: undefined }, retry));
    expect(screen.getByRole('alert')).toHaveTextContent('The fit did not arrive.');
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(retry).toHaveBeenCalledOnce();
  });

  it('says that there is nothing, and shows what there is', () => {
    show(view({ pending: false, error: null, data: [] }));
    expect(screen.getByText('No samples yet.')).toBeInTheDocument();
    show(view({ pending: false, error: null, data: ['one'] }));
    expect(screen.getByText('one')).toBeInTheDocument();
  });
});
