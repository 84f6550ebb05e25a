import { createElement } from 'react';
import type { ElementProps } from './Element';

/** A real HTML element where assistive technology needs one (table, label, select, dl). */
export function Element({ as, css, attributes, elementRef, children }: ElementProps) {
  return createElement(as, { ...attributes, style: css, ref: elementRef }, children);
}
