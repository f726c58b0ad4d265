/** Hazard joined to exposure: totals, zone rows, class rows, change. */
export * from './model';
