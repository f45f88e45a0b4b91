import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { build, preview } from 'vite';

const configFile = fileURLToPath(new URL('../vite.config.ts', import.meta.url));
const FIRST_PORT = 5173;

/**
 * Builds the app unless told not to, and serves the build on `port` or the next free one, to this machine only.
 * @param {{ port?: number, rebuild?: boolean }} [options]
 * @returns {Promise<{ url: string, close: () => Promise<void> }>} the address to open, and how to stop
 */
export async function serve({ port = FIRST_PORT, rebuild = true } = {}) {
  if (rebuild) await build({ configFile, logLevel: 'warn' });
  const server = await preview({
    configFile,
    logLevel: 'warn',
    preview: { host: '127.0.0.1', port, strictPort: false },
  });
  const address = server.httpServer.address();
  if (address === null || typeof address === 'string') throw new Error('serve: the server has no port');
  return { url: `http://localhost:${address.port}/`, close: () => server.close() };
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const { values } = parseArgs({ options: { 'no-build': { type: 'boolean' }, port: { type: 'string' } } });
  const { url } = await serve({
    rebuild: values['no-build'] !== true,
    ...(values.port === undefined ? {} : { port: Number(values.port) }),
  });
  process.stdout.write(`Gapwright is ready: open ${url} (Ctrl+C stops it)\n`);
}
