import { useEffect, useMemo, useState } from 'react';
import type { SampleEntry } from '../../shared/contracts/content';
import { emptyEntry, isEmptyEntry, readBench, type BenchEntry, type BenchReading } from './benchEntry';
import { forgetBench, keepBench, recallBench } from './keptBench';

const KEEP_AFTER_MS = 400;

export interface Bench {
  entry: BenchEntry;
  reading: BenchReading;
  /** ISO time at which the entry was last kept on this device, or null. */
  keptAt: string | null;
  isEmpty: boolean;
  setSample: (part: Partial<SampleEntry>) => void;
  setTargetCv: (text: string) => void;
  clear: () => void;
}

/** The entry of the bench with its live numbers, kept on this device over a reload. */
export function useBench(): Bench {
  const [kept] = useState(recallBench);
  const [entry, setEntry] = useState<BenchEntry>(() => kept?.entry ?? emptyEntry());
  const [keptAt, setKeptAt] = useState<string | null>(kept?.at ?? null);
  const reading = useMemo(() => readBench(entry), [entry]);
  const isEmpty = isEmptyEntry(entry);
  const [isTouched, setTouched] = useState(false);
  useEffect(() => {
    if (!isTouched) return undefined;
    const timer = setTimeout(() => {
      const now = new Date().toISOString();
      if (keepBench(entry, now)) setKeptAt(now);
    }, KEEP_AFTER_MS);
    return () => clearTimeout(timer);
  }, [entry, isTouched]);
  return {
    entry,
    reading,
    keptAt,
    isEmpty,
    setSample: (part) => {
      setTouched(true);
      setEntry((now) => ({ ...now, sample: { ...now.sample, ...part } }));
    },
    setTargetCv: (targetCv) => {
      setTouched(true);
      setEntry((now) => ({ ...now, targetCv }));
    },
    clear: () => {
      setTouched(false);
      forgetBench();
      setKeptAt(null);
      setEntry(emptyEntry());
    },
  };
}
