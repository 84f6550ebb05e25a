import { NoticesScreen } from '../../components/account/NoticesScreen';

export default function NoticesRoute() {
  return <NoticesScreen />;
}
