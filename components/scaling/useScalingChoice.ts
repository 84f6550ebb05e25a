import { router, useLocalSearchParams } from 'expo-router';
import { useCallback, useMemo } from 'react';
import { readChoice, writeChoice, type ScalingChoice, type ScalingParams } from './scalingChoice';

const names = ['y', 'yStructure', 'x', 'xStructure', 'clades', 'method', 'level', 'bands', 'without', 'species', 'version', 'set'] as const;

/** The choice as the address holds it, and its change; the address changes in place, so that Back leaves the screen. */
export function useScalingChoice(): { choice: ScalingChoice; change: (part: Partial<ScalingChoice>) => void } {
  const raw = useLocalSearchParams<Partial<Record<(typeof names)[number], string | string[]>>>();
  const text = JSON.stringify(names.map((name) => raw[name] ?? null));
  const choice = useMemo(() => {
    const values: unknown = JSON.parse(text);
    const params: ScalingParams = {};
    names.forEach((name, index) => {
      const value: unknown = Array.isArray(values) ? values[index] : null;
      const first: unknown = Array.isArray(value) ? value[0] : value;
      if (typeof first === 'string' && first !== '') params[name] = first;
    });
    return readChoice(params);
  }, [text]);
  const change = useCallback((part: Partial<ScalingChoice>) => router.setParams(writeChoice({ ...choice, ...part })), [choice]);
  return { choice, change };
}
