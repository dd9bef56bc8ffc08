export * from './blends';
export * from './limits';
export * from './materials';
export * from './people';
export * from './qualities';
export * from './record';
