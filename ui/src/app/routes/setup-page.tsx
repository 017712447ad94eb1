import { SetupScreen } from '../../features/setup/components/setup-screen';

/** What terminals and trains are made of. */
export function SetupPage() {
  return <SetupScreen />;
}
