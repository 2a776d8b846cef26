import { config } from 'zod';

/**
 * Schemas are compiled with `new Function` where that is allowed. The content security policy
 * forbids it, and even the try would be reported on every page. Imported before any schema is made.
 */
config({ jitless: true });
