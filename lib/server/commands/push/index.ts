import 'server-only';

export { applyOps, pushOps } from './push-ops';
