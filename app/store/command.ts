/** Something the user can do. Button, key, menu and help all read the same value. */
export interface Command {
  readonly id: string;
  /** A plain verb on what it changes. */
  readonly label: string;
  /** As `KeyboardEvent.key` with modifiers in front, `Ctrl+Shift+Z`; letters alone act only in the drawing. */
  readonly keys: readonly string[];
  readonly available: () => boolean;
  readonly run: () => void;
}
