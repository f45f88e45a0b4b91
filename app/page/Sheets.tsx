import { lazy, Suspense } from 'react';
import { useStore } from 'zustand';
import { Help } from '../commands/Help.tsx';
import { addAndSelect } from '../commands/partCommands.ts';
import type { CommandGroup, Services } from '../commands/services.ts';
import { deskStore } from '../desk/deskStore.ts';
import { HandOver } from '../desk/HandOver.tsx';
import { RefusedFile } from '../desk/RefusedFile.tsx';
import { Shelf } from '../desk/Shelf.tsx';
import { sheetScale } from '../layout/sheetDrawing.ts';
import { currentReading } from '../live/reading.ts';
import { CommandButton } from '../panels/CommandButton.tsx';
import type { Commands } from '../panels/useCommand.ts';
import { setView, viewStore } from '../store/viewStore.ts';

interface SheetsProps {
  readonly groups: readonly CommandGroup[];
  readonly commands: Commands;
  readonly services: Services;
}

const PasteSheet = lazy(async () => ({
  default: (await import('../desk/prescription/PasteSheet.tsx')).PasteSheet,
}));

const close = () => setView({ sheet: null });

/** The sheets that lie over the page, one at a time, and above them what a refused file is told. */
export function Sheets({ groups, commands, services }: SheetsProps) {
  const sheet = useStore(viewStore, (view) => view.sheet);
  return (
    <>
      {sheet === 'help' && (
        <Help groups={groups} apple={/Mac|iPhone|iPad/.test(navigator.platform)} onClose={close} />
      )}
      {sheet === 'shelf' && (
        <Shelf
          desk={services.desk}
          ways={
            <>
              <CommandButton commands={commands} id="save" word="Save as a file" />
              <CommandButton commands={commands} id="copyLink" word="Copy a link" />
            </>
          }
          onClose={close}
        />
      )}
      {sheet === 'handOver' && (
        <HandOver
          drawSheet={services.drawSheet}
          date={new Date()}
          scale={sheetScale(currentReading())}
          clipboard={services.clipboard}
          download={services.download}
          print={services.print}
          onClose={close}
        />
      )}
      {sheet === 'prescription' && (
        <Suspense>
          <PasteSheet
            text={deskStore.getState().pasted}
            insert={(edit) => {
              addAndSelect(edit);
              services.fitView('parts');
            }}
            onClose={close}
          />
        </Suspense>
      )}
      <RefusedFile />
    </>
  );
}
