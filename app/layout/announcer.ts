/** How often the live region may speak. */
const QUIET_MS = 500;

/** Texts for one polite live region, the newest at most twice a second. */
export function createAnnouncer(write: (text: string) => void): (text: string) => void {
  let waiting: string | null = null;
  let timer: ReturnType<typeof setTimeout> | null = null;
  const speak = () => {
    timer = null;
    if (waiting === null) return;
    write(waiting);
    waiting = null;
    timer = setTimeout(speak, QUIET_MS);
  };
  return (text) => {
    waiting = text;
    timer ??= setTimeout(speak, QUIET_MS);
  };
}
