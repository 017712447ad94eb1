import { useEffect } from 'react';
import { MyTurnsScreen } from '../../features/my-turn/components/my-turns-screen';

/** The turns of a crew on the phone. */
export function MyPage() {
  useEffect(() => {
    document.title = 'My turns · Stubpost';
  }, []);
  return <MyTurnsScreen />;
}
