import { useEffect, useState } from 'react';
import { Hints } from './commands/Hints.tsx';
import type { CommandGroup, Services } from './commands/services.ts';
import { Notice } from './desk/Notice.tsx';
import { say } from './desk/notices.ts';
import { createAnnouncer } from './layout/announcer.ts';
import type { Board } from './layout/board.ts';
import { JogStrip } from './layout/JogStrip.tsx';
import { Layout } from './layout/Layout.tsx';
import { Tray } from './layout/Tray.tsx';
import { useThemeName } from './layout/theme.ts';
import { ViewTools } from './layout/ViewTools.tsx';
import { currentReading } from './live/reading.ts';
import { Bar } from './page/Bar.tsx';
import { BottomBar } from './page/BottomBar.tsx';
import { Drawers } from './page/Drawers.tsx';
import { EmptySheet } from './page/EmptySheet.tsx';
import { Sheets } from './page/Sheets.tsx';
import { SidePanel } from './page/SidePanel.tsx';
import { chosenReadout } from './panels/readouts/words.ts';
import { SummaryStrip } from './panels/SummaryStrip.tsx';
import type { Commands } from './panels/useCommand.ts';
import './ui/theme.css';
import './page/page.css';
import './App.css';

interface AppProps {
  readonly groups: readonly CommandGroup[];
  readonly commands: Commands;
  readonly services: Services;
  readonly board: () => Board | null;
  readonly onBoard: (board: Board | null) => void;
}

/** The whole page: bar, tray, drawing with ribbon, panel, drawer, and the sheets over them. */
export function App({ groups, commands, services, board, onBoard }: AppProps) {
  const theme = useThemeName();
  useEffect(() => {
    document.documentElement.dataset.theme = theme === 'night' ? 'night' : 'paper';
  }, [theme]);
  const [announce] = useState(() => createAnnouncer(writeVoice));

  return (
    <div className="app">
      <Bar commands={commands} />
      <div className="app-strip">
        <SummaryStrip />
      </div>
      <aside className="app-tray" aria-label="Tray">
        <Tray board={board} />
      </aside>
      <main className="app-sheet">
        <Layout
          theme={theme}
          onBoard={onBoard}
          say={say}
          speak={(text) => text && announce(`${text}. ${chosenReadout(currentReading())}`)}
        />
        <ViewTools board={board} />
        <EmptySheet commands={commands} />
        <Hints />
        <div className="app-notice">
          <Notice />
        </div>
      </main>
      <div className="app-jog">
        <JogStrip board={board} />
      </div>
      <Drawers clipboard={services.clipboard} board={board} />
      <SidePanel commands={commands} />
      <BottomBar commands={commands} clipboard={services.clipboard} board={board} />
      <Sheets groups={groups} commands={commands} services={services} />
      <div id="voice" className="visually-hidden" aria-live="polite" />
    </div>
  );
}

function writeVoice(text: string): void {
  const voice = document.getElementById('voice');
  if (voice) voice.textContent = text;
}
