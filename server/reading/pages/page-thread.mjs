// A thread starts without the loader that the main thread runs under; this gives it its own.
import { register } from 'tsx/esm/api';

register();
await import('./page-thread.ts');
