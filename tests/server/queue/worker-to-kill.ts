// Run as a process of its own with the data folder of a test: takes up one preparation, says so, and works for ever.
import { usePipeline, type Pipeline } from '../../../src/lib/server/queue/pipeline';
import { startQueue } from '../../../src/lib/server/queue/queue';
import { checkArtworkTask } from '../../../src/lib/server/tasks/check-artwork';
import { prepareOrderTask } from '../../../src/lib/server/tasks/prepare-order';

const forEver = () => new Promise<never>(() => undefined);
const pipeline: Pipeline = {
  read: forEver,
  check: forEver,
  keyOf: forEver,
  prepare: async () => {
    process.stdout.write('working\n');
    return forEver();
  },
};
usePipeline(pipeline);
startQueue([checkArtworkTask, prepareOrderTask], { pollMs: 20, leaseMs: 1_500 });
