import { getDocumentAsync, type DocumentPickerAsset } from 'expo-document-picker';
import { useId } from 'react';
import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { Button } from './Button';
import { describedBy, FieldFrame, type FieldText } from './FieldFrame';
import { Sign } from './Sign';
import { Text } from './Text';

interface FileFieldProps extends FieldText {
  /** The chosen file's name and size in bytes, or null. */
  file: { name: string; size: number | null } | null;
  onPick: (asset: DocumentPickerAsset) => void;
  onClear?: () => void;
  /** MIME types. */
  accept?: string[];
  pickLabel?: string;
  disabled?: boolean;
}

/** A file from this device: the system's own chooser, then its name and size. */
export function FileField({ file, onPick, onClear, accept, pickLabel = 'Choose a file', disabled, ...text }: FileFieldProps) {
  const { colour } = useTheme();
  const id = useId();
  const pick = async () => {
    const answer = await getDocumentAsync({ type: accept ?? '*/*', multiple: false });
    const asset = answer.canceled ? undefined : answer.assets[0];
    if (asset) onPick(asset);
  };
  return (
    <FieldFrame id={id} {...text}>
      <View
        role="group"
        aria-labelledby={`${id}-label`}
        aria-describedby={describedBy(id, text)}
        style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: 10, padding: 10, borderWidth: 1, borderStyle: file ? 'solid' : 'dashed', borderColor: text.error ? colour.flagged : colour.tick, borderRadius: radius.control, backgroundColor: file ? colour.sheet : 'transparent' }}
      >
        {file ? (
          <>
            <Sign name="file" tone="inkSoft" />
            <Text size="table" style={{ flexShrink: 1 }}>
              {file.name}
            </Text>
            {file.size === null ? null : (
              <Text size="secondary" tone="inkSoft">
                {sizeInWords(file.size)}
              </Text>
            )}
          </>
        ) : null}
        <Button label={file ? 'Choose another' : pickLabel} disabled={disabled} onPress={() => void pick()} />
        {file && onClear ? <Button kind="quiet" label="Remove" spokenLabel={`Remove ${file.name}`} onPress={onClear} /> : null}
      </View>
    </FieldFrame>
  );
}

/** Bytes in B, kB or MB (powers of 1000). */
export function sizeInWords(bytes: number): string {
  if (bytes < 1000) return `${bytes} B`;
  if (bytes < 1_000_000) return `${Math.round(bytes / 1000)} kB`;
  return `${(bytes / 1_000_000).toFixed(1)} MB`;
}
