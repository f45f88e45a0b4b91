/** How often the live region may speak. */
const QUIET_MS = 500;

/** Texts for one polite live region: only the newest, and at most twice a second. */
export function createAnnouncer(write: (text: string) => void): (text: string) => void {
  let waiting: string | null = null;
  let resting = false;
  const speak = () => {
    resting = waiting !== null;
    if (waiting === null) return;
    write(waiting);
    waiting = null;
    setTimeout(speak, QUIET_MS);
  };
  return (text) => {
    waiting = text;
    if (resting) return;
    resting = true;
    setTimeout(speak, QUIET_MS);
  };
}
