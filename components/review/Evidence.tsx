import { View } from 'react-native';
import type { AttachmentView } from '../../shared/contracts/submissions';
import { attachmentHref } from '../queries/submissions';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { Element } from '../ui/Element';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

const shownAsPicture = new Set(['image/png', 'image/jpeg']);

const sizeText = (bytes: number): string => (bytes < 1_000_000 ? `${Math.max(1, Math.round(bytes / 1000))} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`);

/** Files that stand behind the counts; pictures are shown, each opens in full. */
export function Evidence({ submissionId, attachments, onOpen }: { submissionId: string; attachments: readonly AttachmentView[]; onOpen?: (id: string) => void }) {
  const { colour } = useTheme();
  return (
    <Section title="Evidence" look="small">
      {attachments.length === 0 ? (
        <Text size="table" tone="inkSoft" style={{ paddingTop: 8 }}>
          No file came with this revision.
        </Text>
      ) : null}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 12, paddingTop: 10 }}>
        {attachments.map((file) => {
          const href = attachmentHref(submissionId, file.id);
          return (
            <View key={file.id} style={{ width: 160, gap: 4 }}>
              {shownAsPicture.has(file.mediaType) ? (
                <Element as="img" attributes={{ src: href, alt: file.caption || file.name, loading: 'lazy' }} css={{ width: 160, height: 100, objectFit: 'cover', borderRadius: radius.image, border: `1px solid ${colour.hairline}` }} />
              ) : null}
              <View onPointerUp={() => onOpen?.(file.id)}>
                <TextLink href={href as '/'} size="secondary" outside>
                  {file.caption || file.name}
                </TextLink>
              </View>
              <Text size="least" tone="inkSoft">{`${file.name} · ${sizeText(file.bytes)} · sha256 ${file.sha256.slice(0, 8)}`}</Text>
            </View>
          );
        })}
      </View>
    </Section>
  );
}
