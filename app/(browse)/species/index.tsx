import { useLocalSearchParams } from 'expo-router';
import { SpeciesListScreen } from '../../../components/species/SpeciesListScreen';

export default function SpeciesListRoute() {
  const params = useLocalSearchParams<{ query?: string; clade?: string; structure?: string; version?: string; sort?: string }>();
  return <SpeciesListScreen key={params.query ?? ''} params={params} />;
}
