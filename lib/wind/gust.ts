import { GUST_FACTORS } from '../units';
import type { AveragingExposure, Surface } from '../units';

/** Which exposure of the table stands for which surface. */
const EXPOSURE_OF: Record<Surface, AveragingExposure> = { marine: 'at-sea', open: 'off-land', 'built-up': 'in-land' };

/**
 * Greatest 3-second gust over the 1-minute wind at the same place and surface: G(3, 60) of WMO/TD-No. 1555, table 1.1 (1.11 at
 * sea, 1.36 off-land, 1.49 in-land).
 */
export const gustFactor = (surface: Surface): number => GUST_FACTORS[EXPOSURE_OF[surface]][60][3];
