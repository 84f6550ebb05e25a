import type { CSSProperties, ReactNode, Ref } from 'react';
import { View, type ViewStyle } from 'react-native';

export interface ElementProps {
  /** Element on the web; native shows a View. */
  as: string;
  css?: CSSProperties;
  /** Attributes for the web element. */
  attributes?: Readonly<Record<string, unknown>>;
  nativeStyle?: ViewStyle;
  elementRef?: Ref<HTMLElement>;
  children?: ReactNode;
}

/** A real HTML element where assistive technology needs one (table, label, select, dl); a View on native. */
export function Element({ nativeStyle, children }: ElementProps) {
  return <View style={nativeStyle}>{children}</View>;
}
