import { VersionsScreen } from '../../../components/versions/VersionsScreen';

export default function VersionsRoute() {
  return <VersionsScreen />;
}
