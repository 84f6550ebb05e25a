import { NotFoundScreen } from '../components/layout/NotFoundScreen';

export default function NotFound() {
  return <NotFoundScreen />;
}
