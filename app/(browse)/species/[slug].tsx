import { useLocalSearchParams } from 'expo-router';
import { SpeciesScreen } from '../../../components/species/SpeciesScreen';

export default function SpeciesRoute() {
  const { slug, version } = useLocalSearchParams<{ slug: string; version?: string }>();
  return <SpeciesScreen slug={slug} version={version ?? null} />;
}
