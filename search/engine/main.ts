import { startEngine } from './start-engine.ts';

const MIN_PRODUCTION_KEY_BYTES = 16;

function fail(message: string): never {
  console.error(message);
  process.exit(1);
}

function readPort(text: string): number {
  const port = Number(text);
  if (!/^\d+$/.test(text) || port > 65_535) fail('ENGINE_PORT must be a port number, or 0.');
  return port;
}

const { ENGINE_HOST, ENGINE_PORT, ENGINE_MASTER_KEY, ENGINE_DATA, NODE_ENV } = process.env;

if (!ENGINE_MASTER_KEY) fail('ENGINE_MASTER_KEY must be set.');
if (NODE_ENV === 'production' && Buffer.byteLength(ENGINE_MASTER_KEY) < MIN_PRODUCTION_KEY_BYTES) {
  fail(`ENGINE_MASTER_KEY must have at least ${MIN_PRODUCTION_KEY_BYTES} bytes in production.`);
}
if (!ENGINE_DATA) fail('ENGINE_DATA must name the folder for the snapshot and the log.');

const engine = await startEngine({
  host: ENGINE_HOST ?? '127.0.0.1',
  port: readPort(ENGINE_PORT ?? '0'),
  masterKey: ENGINE_MASTER_KEY,
  dataDir: ENGINE_DATA,
});

process.stdout.write(`${JSON.stringify({ listening: engine.url })}\n`);

let stopping = false;
function stop(): void {
  if (stopping) return;
  stopping = true;
  engine.close().then(
    () => process.exit(0),
    (error: unknown) => {
      console.error('The engine did not stop cleanly:', error);
      process.exit(1);
    },
  );
}
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
