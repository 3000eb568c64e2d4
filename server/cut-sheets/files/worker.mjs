/** Begins the thread that makes files: plain JavaScript, because a new thread does not read TypeScript by itself. */
import { register } from 'tsx/esm/api';

register();
await import('./worker.ts');
