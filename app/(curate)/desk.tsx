import { DeskScreen } from '../../components/desk/DeskScreen';

export default function DeskRoute() {
  return <DeskScreen />;
}
