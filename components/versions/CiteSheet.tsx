import { useState } from 'react';
import { View } from 'react-native';
import { errorInWords } from '../queries/errorInWords';
import { useCitation } from '../queries/versions';
import { Button } from '../ui/Button';
import { Sheet } from '../ui/Dialog';
import { QueryView } from '../ui/QueryView';
import { SegmentedChoice } from '../ui/SegmentedChoice';
import { Text } from '../ui/Text';
import { copyText } from './copyText';

interface CiteSheetProps {
  /** The version. */
  label: string;
  /** Records used; none: the whole version. */
  records: readonly string[];
  title: string;
  onClose: () => void;
}

/** Citation of a version or of exactly the rows used, with their primary sources, to copy. */
export function CiteSheet({ label, records, title, onClose }: CiteSheetProps) {
  const [style, setStyle] = useState<'text' | 'bibtex'>('text');
  return (
    <Sheet open title={title} onClose={onClose}>
      <CitationBox label={label} records={records} style={style} onStyle={setStyle} />
      {records.length > 0 ? <Text size="secondary" tone="inkSoft">{`With the primary sources of the ${records.length} ${records.length === 1 ? 'record' : 'records'} used.`}</Text> : null}
    </Sheet>
  );
}

export function CitationBox({ label, records, style, onStyle }: Pick<CiteSheetProps, 'label' | 'records'> & { style: 'text' | 'bibtex'; onStyle: (style: 'text' | 'bibtex') => void }) {
  const citation = useCitation(label, style, records);
  const [copied, setCopied] = useState<'yes' | 'failed' | null>(null);
  const copy = async (text: string) => setCopied((await copyText(text)) ? 'yes' : 'failed');
  return (
    <View style={{ gap: 12 }}>
      <SegmentedChoice
        label="Style of the citation"
        labelHidden
        value={style}
        options={[
          { value: 'text', label: 'Text' },
          { value: 'bibtex', label: 'BibTeX' },
        ]}
        onChange={(next) => (onStyle(next), setCopied(null))}
      />
      <QueryView pending={citation.isPending} error={citation.error ? errorInWords(citation.error) : null} data={citation.data} onRetry={() => void citation.refetch()}>
        {(text) => (
          <View style={{ gap: 12 }}>
            <Text science={style === 'text'} size="table" style={{ userSelect: 'text' }}>
              {text}
            </Text>
            <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
              <Button kind="primary" label="Copy citation" onPress={() => void copy(text)} />
              {copied ? (
                <Text role="status" size="secondary" tone={copied === 'yes' ? 'settled' : 'flagged'}>
                  {copied === 'yes' ? 'Copied.' : 'Copying is not allowed here: select the text.'}
                </Text>
              ) : null}
            </View>
          </View>
        )}
      </QueryView>
    </View>
  );
}
