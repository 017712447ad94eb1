export { startDemo } from './start-demo';
