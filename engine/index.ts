export { certify } from './certify/certify';
export type * from './contract';
export { EngineInputError } from './errors';
export { profileAngle } from './odour/angle';
