import { createContext, useCallback, useContext, useMemo, useRef, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { bar } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Notice, type NoticeContent } from './Notice';

interface Notices {
  /** Shows a notice; returns its number, for `dismiss`. */
  show: (notice: NoticeContent) => number;
  dismiss: (id: number) => void;
}

const NoticeContext = createContext<Notices | null>(null);
const STAYS_MS = 12_000;
/** Room for a page's fixed row of acts, which a notice never covers. */
const FOOT = 64;

/** Holds the notices of the app and the live region that speaks them. */
export function NoticeProvider({ children }: { children: ReactNode }) {
  const [list, setList] = useState<(NoticeContent & { id: number })[]>([]);
  const last = useRef(0);
  const { wide } = useBreakpoint();
  const dismiss = useCallback((id: number) => setList((now) => now.filter((notice) => notice.id !== id)), []);
  const show = useCallback(
    (notice: NoticeContent) => {
      last.current += 1;
      const id = last.current;
      setList((now) => [...now.slice(-2), { ...notice, id }]);
      // One with an act, or one that says something failed, stays until it is closed.
      if (!notice.action && notice.tone !== 'flagged') setTimeout(() => dismiss(id), STAYS_MS);
      return id;
    },
    [dismiss],
  );
  const value = useMemo(() => ({ show, dismiss }), [show, dismiss]);
  return (
    <NoticeContext.Provider value={value}>
      {children}
      <View
        role="status"
        aria-live="polite"
        style={{ position: 'absolute', zIndex: 15, gap: 8, pointerEvents: 'box-none', bottom: wide ? FOOT + 24 : bar.height + FOOT + 12, right: wide ? 24 : 12, left: wide ? undefined : 12, width: wide ? 420 : undefined }}
      >
        {list.map((notice) => (
          <Notice key={notice.id} {...notice} onClose={() => dismiss(notice.id)} />
        ))}
      </View>
    </NoticeContext.Provider>
  );
}

/** Show and dismiss notices: `const { show } = useNotices(); show({ tone, title, text, action })`. */
export function useNotices(): Notices {
  const notices = useContext(NoticeContext);
  if (!notices) throw new Error('useNotices needs a NoticeProvider above it');
  return notices;
}
