import { usePathname } from 'expo-router';
import { useEffect, useRef, type ReactNode } from 'react';
import { View, type Text as NativeText } from 'react-native';
import type { HeadingLook } from '../theme/typography';
import { Heading } from '../ui/Heading';

/** The address whose heading was last given focus; the first page keeps the browser's own start. */
let lastPath: string | null = null;

interface PageHeadingProps {
  look?: Extract<HeadingLook, 'page' | 'species'>;
  end?: ReactNode;
  children: ReactNode;
}

/** The one h1. After going to another page focus is put on it, so a screen reader says where one is. */
export function PageHeading({ look = 'page', end, children }: PageHeadingProps) {
  const path = usePathname();
  const heading = useRef<NativeText>(null);
  useEffect(() => {
    if (lastPath !== null && lastPath !== path) heading.current?.focus?.();
    lastPath = path;
  }, [path]);
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: 8 }}>
      <Heading level={1} look={look} focusable headingRef={heading}>
        {children}
      </Heading>
      {end}
    </View>
  );
}
