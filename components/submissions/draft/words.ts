import type { SelectOption } from '../../ui/Select';

const plain: Readonly<Record<string, string>> = {
  none: 'none',
  'not-stated': 'not stated',
  'other-side': 'one side counted: double it',
  'mass-fraction': 'by the fraction of the mass',
  'slab-series': 'from a series of slabs',
  both: 'both sides',
  left: 'left side',
  right: 'right side',
  foetal: 'foetal',
  number: 'approval with a number',
  permit: 'permit with a number',
  exempt: 'exempt, with the reason',
  'see-source': 'see the source',
  'topographic-map': 'topographic map',
  'anatomical-connectivity': 'anatomical connectivity',
  'cellular-response-properties': 'cellular response properties',
  'regional-response': 'regional response',
  'gross-landmarks': 'gross landmarks',
};

/** A word of a vocabulary as a form says it. */
export const wordOf = (value: string): string => plain[value] ?? value.replaceAll('-', ' ');

/** Choices of a vocabulary in its own order. */
export function optionsOf<Value extends string>(values: readonly Value[], words?: Readonly<Partial<Record<Value, string>>>): SelectOption<Value>[] {
  return values.map((value) => ({ value, label: words?.[value] ?? wordOf(value) }));
}
