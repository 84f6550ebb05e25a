import { useRef } from 'react';
import type { View } from 'react-native';

interface KeyEvent {
  key: string;
  preventDefault: () => void;
}

/**
 * Arrow keys, Home and End move within a group of which only one member is in the tab order.
 * `move` gets the index to go to; disabled members are the caller's to skip.
 */
export function useRovingFocus(count: number, move: (index: number) => void) {
  const members = useRef<(View | null)[]>([]);
  return {
    register: (index: number) => (member: View | null) => {
      members.current[index] = member;
    },
    onKeyDown: (index: number) => (event: KeyEvent) => {
      const next = nextIndex(event.key, index, count);
      if (next === null) return;
      event.preventDefault();
      move(next);
      members.current[next]?.focus();
    },
  };
}

/** The index a key leads to in a ring of `count`, or null where the key means nothing here. */
export function nextIndex(key: string, index: number, count: number): number | null {
  switch (key) {
    case 'ArrowRight':
    case 'ArrowDown':
      return (index + 1) % count;
    case 'ArrowLeft':
    case 'ArrowUp':
      return (index - 1 + count) % count;
    case 'Home':
      return 0;
    case 'End':
      return count - 1;
    default:
      return null;
  }
}
