import fc from 'fast-check';

/** Properties are tried on the same cases every run; FAST_CHECK_SEED tries others. A seed that fails becomes a test with a name. */
fc.configureGlobal({ seed: Number(process.env.FAST_CHECK_SEED ?? 20310919) });
