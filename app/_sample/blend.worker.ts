import { sampleAnswer } from './sample-answer';

/** Solves in a thread of its own, so that the slider never waits for the arithmetic. */
self.addEventListener('message', ({ data }: MessageEvent<number>) => self.postMessage(sampleAnswer(data)));
