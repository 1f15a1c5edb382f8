import { usePathname } from 'expo-router';
import { useEffect, useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { holdWorkspace, isWorkspace, keepOnDevice, takeOver, useAppVersion } from './app-version';
import { Banner } from './banner';

/** Keeps the application on the device, and offers a new version of it without pressing. */
export function NewVersionNotice() {
  const version = useAppVersion();
  const inWorkspace = isWorkspace(usePathname());
  const [putOff, setPutOff] = useState(false);
  useEffect(() => {
    // The development server has no worker to give.
    if (!__DEV__) void keepOnDevice();
  }, []);
  useEffect(() => (inWorkspace ? holdWorkspace() : undefined), [inWorkspace]);
  return (
    <View role="status" dataSet={{ print: 'hide' }}>
      {version === 'current' || putOff ? null : (
        <Banner
          title="A new version is ready."
          words={
            inWorkspace
              ? 'This look-up is in the address and stays as it is.'
              : 'Finish what you are typing first. It comes by itself when the application is opened next.'
          }
          tone="pen"
        >
          <Button kind="quiet" label="Take it over" onPress={takeOver} />
          <Button kind="quiet" label="Later" onPress={() => setPutOff(true)} />
        </Banner>
      )}
    </View>
  );
}
