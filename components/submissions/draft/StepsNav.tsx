import { Pressable, View } from 'react-native';
import type { CheckResult } from '../../../shared/contracts/checks';
import { useBreakpoint } from '../../layout/useBreakpoint';
import { useTheme } from '../../theme/ThemeProvider';
import { target } from '../../theme/tokens';
import { Span, Text } from '../../ui/Text';
import { countOf, type Step, type StepKey } from './steps';

interface StepsNavProps {
  steps: readonly Step[];
  current: StepKey;
  checks: readonly CheckResult[];
  onGo: (step: StepKey) => void;
}

/**
 * The steps along an axis, each a tick; the one you are in is the point. How much is open in a step stands beside its
 * name. On a phone the ticks carry numbers, and the name of the current step stands under the axis.
 */
export function StepsNav({ steps, current, checks, onGo }: StepsNavProps) {
  const { wide } = useBreakpoint();
  const { colour } = useTheme();
  const at = steps.findIndex((step) => step.key === current);
  return (
    <View style={{ gap: 2 }}>
      <View role="navigation" aria-label="Steps" style={{ flexDirection: 'row', borderTopWidth: 1.5, borderTopColor: colour.tick, marginTop: 6 }}>
        {steps.map((step, index) => {
          const on = step.key === current;
          const { blocks, warns } = countOf(step.key, checks);
          const spoken = `${step.label}${blocks > 0 ? `, ${blocks} missing or impossible` : ''}${warns > 0 ? `, ${warns} doubtful` : ''}`;
          return (
            <Pressable key={step.key} role="link" aria-label={spoken} aria-current={on ? 'step' : undefined} onPress={() => onGo(step.key)} style={{ minHeight: wide ? 44 : target.phone, justifyContent: 'center', flexGrow: 1, flexBasis: wide ? 'auto' : 0, paddingTop: 6, paddingRight: 12 }}>
              {on ? (
                <View style={{ position: 'absolute', top: -6.5, left: 0, width: 11, height: 11, borderRadius: 6, backgroundColor: colour.cresyl }} />
              ) : (
                <View style={{ position: 'absolute', top: -1, left: 0, width: 1.5, height: 9, backgroundColor: colour.tick }} />
              )}
              <Text size="table" weight={on ? 'semibold' : 'regular'} tone={on ? 'ink' : 'inkSoft'} nowrap>
                {wide ? `${index + 1} ${step.label}` : String(index + 1)}
                {blocks + warns > 0 ? <Span tone={blocks > 0 ? 'waiting' : 'flagged'} weight="semibold" style={{ fontSize: 13 }}>{`  ${blocks + warns}`}</Span> : null}
              </Text>
            </Pressable>
          );
        })}
      </View>
      {wide ? null : (
        <Text weight="semibold">
          {`${at + 1} of ${steps.length} · ${steps[at]?.label ?? ''}`}
        </Text>
      )}
    </View>
  );
}
