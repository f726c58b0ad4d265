/** Hazard joined to exposure: totals, zone rows, class rows, change. */
export * from './assetTable';
export * from './change';
export * from './members';
export * from './model';
export * from './tabulate';
