import { activateKeepAwakeAsync, deactivateKeepAwake } from 'expo-keep-awake';
import { useEffect } from 'react';

const tag = 'workspace';

/** Keeps the screen lit while the workspace is shown: both hands are in the machine. Where it cannot, nothing is said. */
export function useKeepAwake(): void {
  useEffect(() => {
    const awake = () => {
      if (document.visibilityState === 'visible') activateKeepAwakeAsync(tag).catch(() => undefined);
    };
    awake();
    // The system lets go of it whenever the page is hidden.
    document.addEventListener('visibilitychange', awake);
    return () => {
      document.removeEventListener('visibilitychange', awake);
      deactivateKeepAwake(tag).catch(() => undefined);
    };
  }, []);
}
