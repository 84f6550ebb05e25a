import { View } from 'react-native';
import { errorInWords } from '../queries/errorInWords';
import { useVerify } from '../queries/versions';
import { StateSign } from '../marks/StateSign';
import { Button } from '../ui/Button';
import { Span, Text } from '../ui/Text';

/** The checksum of the manifest in groups of eight, and the reading of the stored files again. */
export function Manifest({ label, sha256 }: { label: string; sha256: string }) {
  const verify = useVerify(label);
  const groups = sha256.match(/.{8}/g) ?? [];
  const wrong = verify.data?.files.filter((file) => !file.ok) ?? [];
  return (
    <View style={{ gap: 8 }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', alignItems: 'flex-end', gap: 12 }}>
        <View style={{ flexShrink: 1 }}>
          <Text size="secondary" tone="inkSoft">
            SHA-256 of the manifest; the section above is drawn from it
          </Text>
          <Text size="table" style={{ userSelect: 'text' }}>
            {groups.map((group, index) => (
              <Span key={index} tone={index % 2 === 0 ? 'ink' : 'inkSoft'}>
                {`${group} `}
              </Span>
            ))}
          </Text>
        </View>
        <Button label="Verify here" working={verify.isPending} workingLabel="Reading the files" onPress={() => verify.mutate()} />
      </View>
      {verify.data ? (
        <View role="status">
          {verify.data.ok ? (
            <StateSign state="verified" words={`all ${verify.data.files.length} files were read again: size and SHA-256 agree`} />
          ) : (
            <StateSign state="impossible" words={`not as frozen: ${wrong.map((file) => file.name).join(', ')}`} />
          )}
        </View>
      ) : null}
      {verify.error ? (
        <Text role="alert" tone="flagged">
          {errorInWords(verify.error).text}
        </Text>
      ) : null}
    </View>
  );
}
