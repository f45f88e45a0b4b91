import type { ClipboardHost } from '../desk/clipboard.ts';
import type { Desk } from '../desk/desk.ts';
import type { Rasterise } from '../desk/exports.ts';
import type { FileHost } from '../desk/files.ts';
import type { Command } from '../store/command.ts';

/** What commands need beyond the stores; the app passes it in. */
export interface Services {
  readonly desk: Desk;
  readonly clipboard: ClipboardHost;
  readonly download: FileHost['download'];
  readonly rasterise: Rasterise;
  /** The dimensioned drawing as an SVG text, on paper. */
  readonly drawSheet: () => string;
  readonly fitView: (what: 'parts' | 'everything') => void;
  /** Prints what is on the screen, once it is drawn. */
  readonly print: () => void;
  /** The address of the page, for a link that carries the sketch. */
  readonly page: () => string;
}

/** Commands that are listed together. */
export interface CommandGroup {
  readonly title: string;
  readonly commands: readonly Command[];
}
