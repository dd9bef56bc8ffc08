/** A fault of the caller: `path` names the field, the message is a sentence about it. */
export class EngineInputError extends Error {
  override readonly name = 'EngineInputError';
  constructor(
    readonly path: string,
    sentence: string,
  ) {
    super(sentence);
  }
}
