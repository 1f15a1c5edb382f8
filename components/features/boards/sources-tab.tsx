import type { Bench } from '@/components/features/diagnose/bench';
import { Panel } from '@/components/ui/panel';
import { Split } from '@/components/ui/split';
import { ExampleList } from './example-list';
import { SourceList } from './source-list';

/** What the layout rests on: its sources, and the worked examples, run as the page is opened. */
export function SourcesTab({ bench }: { bench: Bench }) {
  return (
    <Split
      mainLabel="What it rests on"
      asideLabel="What was tried"
      main={
        <Panel title="Sources" note="Where the facts come from, and which of them each one proves.">
          <SourceList sources={bench.document.sources} />
        </Panel>
      }
      aside={
        <Panel title="Worked examples" note="Codes whose socket somebody has seen. They are run now, on this layout.">
          <ExampleList bench={bench} />
        </Panel>
      }
    />
  );
}
