export { certify } from './certify/certify';
export type * from './contract';
export { EngineInputError } from './errors';
export { profileAngle } from './odour/angle';
export { blendProfile } from './odour/blend-profile';
export { evaporate } from './odour/evaporate';
export { estimateEvaporation } from './odour/evaporation-rate';
export { estimateStrength, STRENGTH_CLASSES, twoDigits } from './odour/strength';
