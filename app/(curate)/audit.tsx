import { AuditScreen } from '../../components/people/AuditScreen';

export default function AuditRoute() {
  return <AuditScreen />;
}
