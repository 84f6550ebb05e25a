import { ScalingScreen } from '../../components/scaling/ScalingScreen';

export default function ScalingRoute() {
  return <ScalingScreen />;
}
