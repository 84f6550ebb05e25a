import { BenchScreen } from '../../components/layout/lazy/LazyScreens';

export default function BenchRoute() {
  return <BenchScreen />;
}
