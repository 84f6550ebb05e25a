import { AppRoot } from '../components/layout/AppRoot';

export { FailedApp as ErrorBoundary } from '../components/layout/FailedApp';

export default function RootLayout() {
  return <AppRoot />;
}
