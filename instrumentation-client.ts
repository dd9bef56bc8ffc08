/** What Next runs in the browser before anything else of ours. */
import './lib/shared/zod-without-eval';
