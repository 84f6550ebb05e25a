import { TaxaScreen } from '../../../components/curate/TaxaScreen';

export default function TaxaRoute() {
  return <TaxaScreen />;
}
