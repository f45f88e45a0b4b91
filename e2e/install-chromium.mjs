import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import process from 'node:process';
import { chromium } from '@playwright/test';
import { chromiumPath, isRoot } from './chromium.mjs';

/** Ways to come by a browser, tried in this order until one is there; a browser the user named is never replaced. */
const WAYS = [
  {
    can: isRoot && existsSync('/usr/bin/apt-get'),
    commands: ['apt-get update', 'apt-get install -y --no-install-recommends chromium fonts-dejavu-core'],
  },
  { can: true, commands: ['npx playwright install chromium'] },
];

const found = () => existsSync(chromiumPath() ?? chromium.executablePath());

/** @param {string} command */
function run(command) {
  process.stdout.write(`No Chromium yet: ${command}\n`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  return spawnSync(command, { shell: true, env, stdio: ['ignore', 'inherit', 'inherit'] }).status === 0;
}

for (const { can, commands } of process.env.CHROMIUM_PATH ? [] : WAYS) {
  if (!found() && can) commands.every(run);
}

if (!found()) {
  process.stderr.write(
    'The browser tests need Chromium: install it, or name the program in the environment as CHROMIUM_PATH.\n',
  );
  process.exitCode = 1;
}
