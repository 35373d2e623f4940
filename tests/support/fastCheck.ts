import fc from 'fast-check'

/** The same examples in every run, so that a red run can be repeated; EMBERLINE_SEED tries others. */
fc.configureGlobal({ seed: Number(process.env['EMBERLINE_SEED'] ?? 20261201) })
