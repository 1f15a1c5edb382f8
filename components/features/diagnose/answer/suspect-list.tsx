import { useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Panel } from '@/components/ui/panel';
import type { Diagnosis } from '@/shared';
import { SuspectEntry } from './suspect-entry';
import { leadingSuspects } from './suspect-words';

/** Suspects that stand at once. */
const atOnce = 4;

/** The suspects in order, each with its reasons. */
export function SuspectList({ diagnosis, onShow }: { diagnosis: Diagnosis; onShow: (socket: string) => void }) {
  const [all, setAll] = useState(false);
  const { suspects } = diagnosis;
  if (suspects.length === 0) return null;
  const leading = leadingSuspects(diagnosis).slice(0, atOnce);
  const shown = all ? suspects : leading;
  return (
    <Panel title="Suspects">
      <View role="list" aria-label="Suspects">
        {shown.map((suspect) => (
          <SuspectEntry key={suspect.id} suspect={suspect} onShow={onShow} />
        ))}
      </View>
      {suspects.length > leading.length ? (
        <Button
          kind="quiet"
          label={all ? 'Show the first only' : `Show ${suspects.length - leading.length} more, all less likely`}
          aria-expanded={all}
          onPress={() => setAll(!all)}
        />
      ) : null}
    </Panel>
  );
}
