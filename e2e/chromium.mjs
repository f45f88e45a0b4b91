import { existsSync } from 'node:fs';
import process from 'node:process';

const DEBIAN = ['/usr/bin/chromium', '/usr/bin/chromium-browser'];

/** Whether this process is root, for whom Chromium's sandbox does not start. */
export const isRoot = process.getuid?.() === 0;

/**
 * The one place that finds the browser: what CHROMIUM_PATH names, else Debian's Chromium.
 * @returns {string | undefined} the executable; undefined leaves the choice to Playwright, which knows its own
 */
export function chromiumPath() {
  return process.env.CHROMIUM_PATH || DEBIAN.find((path) => existsSync(path));
}

/** How every browser of the tests and pictures is launched. */
export function launchOptions() {
  const executablePath = chromiumPath();
  return {
    ...(executablePath === undefined ? {} : { executablePath }),
    chromiumSandbox: !isRoot,
    args: isRoot ? ['--disable-quic', '--disable-gpu', '--disable-background-networking'] : [],
  };
}
