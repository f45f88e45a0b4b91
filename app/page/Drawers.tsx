import { useStore } from 'zustand';
import { type ClipboardHost, copyText } from '../desk/clipboard.ts';
import { Ledger } from '../panels/Ledger.tsx';
import { TraceSheet } from '../panels/TraceSheet.tsx';
import { type Drawer, setView, viewStore } from '../store/viewStore.ts';
import { Tabs } from '../ui/Tabs.tsx';
import { SpacingPreview } from './SpacingPreview.tsx';

const TABS: readonly { readonly id: Drawer; readonly label: string }[] = [
  { id: 'ledger', label: 'Ledger' },
  { id: 'trace', label: 'Trace sheet' },
  { id: 'table', label: 'Spacing table' },
];

interface DrawersProps {
  readonly clipboard: ClipboardHost;
}

/** The drawer under the drawing; pressing the open tab closes it. */
export function Drawers({ clipboard }: DrawersProps) {
  const drawer = useStore(viewStore, (view) => view.drawer);
  return (
    <section className="drawers" aria-label="Drawer">
      <Tabs
        label="Drawer"
        tabs={TABS}
        selected={drawer}
        onSelect={(id) => setView({ drawer: id === drawer ? null : id })}
      >
        {drawer && (
          <div className="drawers-body">
            {drawer === 'ledger' && <Ledger />}
            {drawer === 'trace' && (
              <TraceSheet onCopy={(text) => void copyText(clipboard, text, 'The trace sheet')} />
            )}
            {drawer === 'table' && <SpacingPreview />}
          </div>
        )}
      </Tabs>
    </section>
  );
}
