import sharp from 'sharp';

// The cache serves old pixels and grows; one thread a picture keeps memory flat while several tasks run.
sharp.cache(false);
sharp.concurrency(1);

/** sharp as every stage of the pipeline uses it: no cache, one thread. */
export { sharp };
