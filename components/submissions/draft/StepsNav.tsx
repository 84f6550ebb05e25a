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

/** The steps along an axis, each a tick; the one you are in is the point. What is missing in a step stands raised beside it. */
export function StepsNav({ steps, current, checks, onGo }: StepsNavProps) {
  const { wide } = useBreakpoint();
  const { colour } = useTheme();
  return (
    <View role="navigation" aria-label="Steps" style={{ flexDirection: 'row', flexWrap: 'wrap', borderTopWidth: wide ? 1.5 : 0, borderTopColor: colour.tick, columnGap: wide ? 0 : 14 }}>
      {steps.map((step, index) => {
        const on = step.key === current;
        const { blocks, warns } = countOf(step.key, checks);
        const spoken = `${step.label}${blocks > 0 ? `, ${blocks} missing or impossible` : ''}${warns > 0 ? `, ${warns} doubtful` : ''}`;
        return (
          <Pressable
            key={step.key}
            role="link"
            aria-label={spoken}
            aria-current={on ? 'step' : undefined}
            onPress={() => onGo(step.key)}
            style={{ minHeight: wide ? 48 : target.phone, justifyContent: 'center', flexGrow: wide ? 1 : 0, flexBasis: wide ? 0 : 'auto', borderTopWidth: wide ? 0 : 1.5, borderTopColor: colour.tick, paddingTop: 6 }}
          >
            <View style={{ position: 'absolute', top: wide ? -1 : -1.5, left: 0, width: 1.5, height: on ? 0 : 9, backgroundColor: colour.tick }} />
            {on ? <View style={{ position: 'absolute', top: -6.5, left: 0, width: 11, height: 11, borderRadius: 6, backgroundColor: colour.cresyl }} /> : null}
            <Text size={wide ? 'table' : 'least'} weight={on ? 'semibold' : 'regular'} tone={on ? 'ink' : 'inkSoft'}>
              {`${index + 1} ${step.label}`}
              {blocks + warns > 0 ? <Span tone={blocks > 0 ? 'waiting' : 'flagged'} weight="semibold">{`  ${blocks + warns}`}</Span> : null}
            </Text>
          </Pressable>
        );
      })}
    </View>
  );
}
