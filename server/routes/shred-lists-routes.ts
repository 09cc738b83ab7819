import { Router } from 'express';
import type { Deps } from '../deps.ts';

export function shredListRoutes(_deps: Deps): Router {
  return Router();
}
