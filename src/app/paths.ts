export { paths } from '../lib/paths.ts';
