import { useId, type ReactNode } from 'react';
import { Modal, Pressable, ScrollView, View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Button, type ButtonKind } from './Button';
import { Heading } from './Heading';
import { Text } from './Text';

interface SheetProps {
  open: boolean;
  title: string;
  onClose: () => void;
  /** Word of the closing act at the top right. */
  closeLabel?: string;
  /** Acts in a fixed row at the foot. */
  foot?: ReactNode;
  /** Width on wide screens. */
  width?: number;
  children: ReactNode;
}

/** Over the page: from below on a phone, in the middle on wide screens. Focus is held inside, Esc closes, focus goes back. */
export function Sheet({ open, title, onClose, closeLabel = 'Done', foot, width = 520, children }: SheetProps) {
  const { colour } = useTheme();
  const { wide, height } = useBreakpoint();
  const titleId = useId();
  return (
    <Modal visible={open} transparent animationType="none" onRequestClose={onClose} aria-labelledby={titleId} accessibilityLabelledBy={titleId}>
      <View style={{ flex: 1, justifyContent: wide ? 'center' : 'flex-end', alignItems: 'center' }}>
        <Pressable tabIndex={-1} aria-hidden={true} onPress={onClose} style={{ position: 'absolute', top: 0, right: 0, bottom: 0, left: 0, backgroundColor: colour.scrim }} />
        <View
          style={{
            width: wide ? width : '100%',
            maxWidth: '100%',
            maxHeight: wide ? height - 64 : height - 48,
            backgroundColor: colour.ground,
            borderTopLeftRadius: radius.control,
            borderTopRightRadius: radius.control,
            borderBottomLeftRadius: wide ? radius.control : 0,
            borderBottomRightRadius: wide ? radius.control : 0,
            borderWidth: wide ? 1 : 0,
            borderColor: colour.tick,
          }}
        >
          <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', gap: 12, paddingHorizontal: 16, paddingTop: 12 }}>
            <Heading level={2} id={titleId} style={{ flexShrink: 1 }}>
              {title}
            </Heading>
            <Button kind="quiet" label={closeLabel} onPress={onClose} style={{ marginRight: -8 }} />
          </View>
          <ScrollView style={{ flexShrink: 1 }} contentContainerStyle={{ padding: 16, paddingTop: 8, gap: 16 }}>
            {children}
          </ScrollView>
          {foot ? <View style={{ flexDirection: 'row', gap: 10, padding: 16, borderTopWidth: 1, borderTopColor: colour.hairline }}>{foot}</View> : null}
        </View>
      </View>
    </Modal>
  );
}

interface ConfirmDialogProps {
  open: boolean;
  /** A question that names the act and its object: "Decline revision 2 of SV-07?". */
  question: string;
  /** What will happen. */
  consequence: string;
  confirmLabel: string;
  cancelLabel: string;
  kind?: Extract<ButtonKind, 'danger' | 'primary'>;
  working?: boolean;
  onConfirm: () => void;
  onCancel: () => void;
  /** A reason to type, for instance. */
  children?: ReactNode;
}

/** Asks once before a final act. */
export function ConfirmDialog({ open, question, consequence, confirmLabel, cancelLabel, kind = 'danger', working, onConfirm, onCancel, children }: ConfirmDialogProps) {
  const { colour } = useTheme();
  const { wide } = useBreakpoint();
  const titleId = useId();
  return (
    <Modal visible={open} transparent animationType="none" onRequestClose={onCancel} accessibilityLabelledBy={titleId}>
      <View style={{ flex: 1, justifyContent: wide ? 'center' : 'flex-end', alignItems: 'center' }}>
        <Pressable tabIndex={-1} aria-hidden={true} onPress={onCancel} style={{ position: 'absolute', top: 0, right: 0, bottom: 0, left: 0, backgroundColor: colour.scrim }} />
        <View
          style={{ width: wide ? 520 : '100%', padding: 16, gap: 12, backgroundColor: colour.sheet, borderWidth: 1, borderColor: colour.hairline, borderLeftWidth: 4, borderLeftColor: kind === 'danger' ? colour.flagged : colour.cresyl, borderRadius: wide ? radius.control : 0 }}
        >
          <Heading level={2} look="small" id={titleId} style={{ fontSize: 17, lineHeight: 24 }}>
            {question}
          </Heading>
          <Text>{consequence}</Text>
          {children}
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'flex-end', gap: 10 }}>
            <Button label={cancelLabel} onPress={onCancel} />
            <Button kind={kind} label={confirmLabel} working={working} onPress={onConfirm} />
          </View>
        </View>
      </View>
    </Modal>
  );
}
