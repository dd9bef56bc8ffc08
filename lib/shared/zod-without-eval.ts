/**
 * Imported before anything that uses zod in a browser. zod would try whether it may make code from text, which the
 * policy of our pages refuses and reports; this is the switch by which it leaves that alone (its `jitless`).
 */
Object.assign(globalThis, { __zod_globalConfig: { jitless: true } });

export {};
