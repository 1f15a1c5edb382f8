import { View } from 'react-native';
import { useOnline } from '@/components/api/use-online';
import { Banner } from './banner';

/** Says that there is no network, and what still works. The place is always there, so that it is read out when it fills. */
export function OfflineNotice() {
  const online = useOnline();
  return (
    <View role="status" dataSet={{ print: 'hide' }}>
      {online ? null : (
        <Banner title="Offline" words="Boards opened before still work. Nothing you type is lost." tone="mark" />
      )}
    </View>
  );
}
