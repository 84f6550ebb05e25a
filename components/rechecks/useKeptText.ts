import { useState } from 'react';

const keyOf = (name: string) => `allokarya.text.${name}`;

function recall(name: string): string {
  try {
    return globalThis.localStorage?.getItem(keyOf(name)) ?? '';
  } catch {
    return '';
  }
}

/** A text that stays on this device until it is sent: [text, set, forget]. */
export function useKeptText(name: string): [string, (text: string) => void, () => void] {
  const [text, setText] = useState(() => recall(name));
  const set = (next: string) => {
    setText(next);
    try {
      globalThis.localStorage?.setItem(keyOf(name), next);
    } catch {
      // Storage may be forbidden; the text then lives as long as the page.
    }
  };
  const forget = () => {
    setText('');
    try {
      globalThis.localStorage?.removeItem(keyOf(name));
    } catch {
      // Nothing was kept.
    }
  };
  return [text, set, forget];
}
