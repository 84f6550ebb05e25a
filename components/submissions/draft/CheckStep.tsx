import { View } from 'react-native';
import type { CheckResult } from '../../../shared/contracts/checks';
import type { SubmissionContent } from '../../../shared/contracts/content';
import type { Preview } from '../../../shared/contracts/submissions';
import { explanationKey, unexplainedWarnings } from '../../../shared/domain/checks/outcome';
import { fieldName } from '../../../shared/domain/fieldNames';
import { useBreakpoint } from '../../layout/useBreakpoint';
import { CheckList } from '../../marks/CheckList';
import { checkRows } from '../../marks/checkRows';
import { PlacesOfSubmission } from '../../review/PlacesOfSubmission';
import { useTheme } from '../../theme/ThemeProvider';
import { Button } from '../../ui/Button';
import { Disclosure } from '../../ui/Disclosure';
import { Section } from '../../ui/Section';
import { Sign } from '../../ui/Sign';
import { Text } from '../../ui/Text';
import { TextField } from '../../ui/TextField';
import { useDraftContext } from './DraftContext';

interface CheckStepProps {
  content: SubmissionContent;
  preview: Preview | null;
  pending: boolean;
  failed: boolean;
  onExplain: (key: string, text: string) => void;
  onReach: (path: string) => void;
}

/** Everything found, by level, each with its way to the field; a word is asked on what is doubtful. */
export function CheckStep({ content, preview, pending, failed, onExplain, onReach }: CheckStepProps) {
  const { checks, refused, tried } = useDraftContext();
  const { sideBySide } = useBreakpoint();
  const blocks = checks.filter((check) => check.level === 'blocks');
  const warns = checks.filter((check) => check.level === 'warns');
  const passes = checks.filter((check) => check.level === 'passes');
  const known = new Set(checks.map((check) => check.path));
  const others = refused.filter((found) => !known.has(found.path));
  const open = blocks.length + others.length + unexplainedWarnings(checks, content.explanations).length;
  return (
    <View style={{ flexDirection: sideBySide ? 'row' : 'column', gap: sideBySide ? 40 : 24 }}>
      <View style={{ flex: sideBySide ? 1.4 : undefined, minWidth: 0, gap: 24 }}>
        {tried && open > 0 ? (
          <Text role="alert" weight="semibold" tone="flagged">
            {`Not submitted yet: ${open === 1 ? 'one thing is' : `${open} things are`} still open below.`}
          </Text>
        ) : null}
        <Section title={blocks.length === 0 ? 'Nothing is missing or impossible' : `Missing or impossible, ${blocks.length}`} id="field-blocks">
          {blocks.map((check) => (
            <Finding key={`${check.code}@${check.path}`} check={check} content={content} onReach={onReach} />
          ))}
          {others.map((found) => (
            <Finding key={`refused@${found.path}`} check={{ code: 'refused', level: 'blocks', path: found.path, message: found.message, figure: null, limit: null }} content={content} onReach={onReach} />
          ))}
        </Section>
        {warns.length > 0 ? (
          <Section title={`Doubtful, ${warns.length}`} end={<Text size="secondary" tone="inkSoft">each needs a word</Text>}>
            {warns.map((check) => (
              <Finding key={`${check.code}@${check.path}`} check={check} content={content} onReach={onReach} word={content.explanations[explanationKey(check)] ?? ''} onWord={(text) => onExplain(explanationKey(check), text)} />
            ))}
          </Section>
        ) : null}
        {passes.length > 0 ? (
          <Disclosure label={`Checks that pass, ${passes.length}`}>
            <CheckList checks={checkRows(passes, {}, content)} />
          </Disclosure>
        ) : null}
      </View>
      <View style={{ flex: sideBySide ? 1 : undefined, minWidth: 0, gap: 8 }}>
        {preview && preview.structures.length > 0 ? <PlacesOfSubmission structures={preview.structures} /> : null}
        <Text role="status" size="secondary" tone="inkSoft">
          {failed ? 'The place on the line could not be computed just now; submitting asks for it again.' : pending ? 'Computing with the newest entries.' : ' '}
        </Text>
      </View>
    </View>
  );
}

interface FindingProps {
  check: CheckResult;
  content: SubmissionContent;
  onReach: (path: string) => void;
  word?: string;
  onWord?: (text: string) => void;
}

function Finding({ check, content, onReach, word, onWord }: FindingProps) {
  const { colour } = useTheme();
  const { tried } = useDraftContext();
  const { wide } = useBreakpoint();
  const name = fieldName(check.path, content);
  const unsaid = onWord !== undefined && (word ?? '').trim() === '';
  return (
    <View role="group" aria-label={`${check.code.replaceAll('-', ' ')} at ${name}`} style={{ flexDirection: 'row', gap: 10, paddingVertical: 8, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
      <View style={{ paddingTop: 6 }}>
        <Sign name={check.level === 'blocks' ? 'cross' : 'ring'} tone="flagged" />
      </View>
      <View style={{ flex: 1, minWidth: 0, gap: 4 }}>
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 12, justifyContent: 'space-between', alignItems: 'center' }}>
          <Button kind="quiet" label={name} spokenLabel={`Go to ${name}`} onPress={() => onReach(check.path)} style={{ marginLeft: -8, marginVertical: wide ? -6 : -8, flexShrink: 1 }} />
          {check.figure ? <Text size="secondary" tone="inkSoft">{check.limit ? `${check.figure}, expected ${check.limit}` : check.figure}</Text> : null}
        </View>
        <Text size="table">{check.message}</Text>
        {onWord ? <TextField label={`Your word on ${name}`} value={word ?? ''} onChangeText={onWord} maxLength={2000} rows={2} error={tried && unsaid ? 'Say in a sentence why it is as it is, or correct it.' : undefined} /> : null}
      </View>
    </View>
  );
}
