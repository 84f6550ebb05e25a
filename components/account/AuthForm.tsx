import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Screen } from '../layout/Screen';
import { Button } from '../ui/Button';
import { Element } from '../ui/Element';
import { Text } from '../ui/Text';

interface AuthFormProps {
  title: string;
  sub?: string;
  /** Of the act at the foot of the form. */
  submitLabel: string;
  working: boolean;
  /** What went wrong with the whole form, in words. */
  failure: string | null;
  onSubmit: () => void;
  /** Below the act: other ways. */
  others?: ReactNode;
  children: ReactNode;
}

/** A short form in one column: fields, one act, what failed above it. */
export function AuthForm({ title, sub, submitLabel, working, failure, onSubmit, others, children }: AuthFormProps) {
  return (
    <Screen title={title} sub={sub}>
      <Element
        as="form"
        css={{ display: 'flex', flexDirection: 'column', gap: 16, maxWidth: 420, width: '100%' }}
        attributes={{ 'aria-label': title, noValidate: true, onSubmit: (event: { preventDefault: () => void }) => event.preventDefault() }}
      >
        {children}
        {failure ? (
          <Text role="alert" tone="flagged" weight="semibold">
            {failure}
          </Text>
        ) : null}
        <Button kind="primary" label={submitLabel} working={working} onPress={onSubmit} />
      </Element>
      {others ? <View style={{ gap: 8 }}>{others}</View> : null}
    </Screen>
  );
}
