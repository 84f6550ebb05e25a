import { AppRoot } from '../components/layout/AppRoot';

export default function RootLayout() {
  return <AppRoot />;
}
