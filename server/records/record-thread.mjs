import { register } from 'tsx/esm/api';

// A thread does not take over how its parent reads TypeScript: it says so itself, then begins.
register();
await import('./record-worker.ts');
