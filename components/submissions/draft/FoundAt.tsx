import { View } from 'react-native';
import { fieldName } from '../../../shared/domain/fieldNames';
import { Sign } from '../../ui/Sign';
import { Text } from '../../ui/Text';
import { useDraftContext } from './DraftContext';

/** What was found at a part of the form that is no single field; `under` also what was found at fields within it. */
export function FoundAt({ path, under, without = [] }: { path: string; under?: boolean; without?: readonly string[] }) {
  const { checks, tried, content } = useDraftContext();
  const here = checks.filter(
    (check) =>
      (check.path === path || (under && check.path.startsWith(`${path}.`))) &&
      !without.includes(check.code) &&
      (check.level === 'warns' || (check.level === 'blocks' && (tried || check.code !== 'missing'))),
  );
  return (
    <>
      {here.map((check) => {
        const field = check.path === path ? '' : fieldName(check.path.slice(path.length - (path.split('.').at(-1) ?? '').length), content);
        return (
          <View key={`${check.code}@${check.path}`} style={{ flexDirection: 'row', gap: 6 }}>
            <View style={{ paddingTop: 2 }}>
              <Sign name={check.level === 'blocks' ? 'cross' : 'ring'} tone="flagged" size={14} />
            </View>
            <Text size="secondary" tone="flagged" style={{ flexShrink: 1 }}>
              {field ? `${field}: ${check.message}` : check.message}
            </Text>
          </View>
        );
      })}
    </>
  );
}
