import type { Stage } from './model';

/** Winds from here on make a depression a storm (US National Weather Service scale, 1-min). */
const STORM_FORCE_KT = 34;

const byWind = (maxWindKt: number): Stage => (maxWindKt < STORM_FORCE_KT ? 'depression' : 'tropical');

/**
 * The stage a bulletin's title gives (`TROPICAL DEPRESSION`, `REMNANTS OF`). Undefined where the title
 * does not say, such as the bare `TROPICAL CYCLONE`.
 */
export function stageOfTitle(title: string): Stage | undefined {
  const words = title.toUpperCase();
  if (/POTENTIAL|DISTURBANCE|TROPICAL LOW/.test(words)) return 'disturbance';
  if (/REMN/.test(words)) return 'remnant-low';
  if (/POST-?\s*TROP|EXTRA-?\s*TROP/.test(words)) return 'post-tropical';
  if (/SUB-?\s*TROP/.test(words)) return 'subtropical';
  if (/DEPRESSION/.test(words)) return 'depression';
  if (/HURRICANE|TYPHOON|TROPICAL STORM|CYCLONIC STORM/.test(words)) return 'tropical';
  return undefined;
}

/** The stage a remark on a forecast line gives (`...POST-TROP/REMNT LOW`); undefined where it gives none (`...INLAND`). */
export function stageOfRemark(remark: string, maxWindKt: number): Stage | undefined {
  // "BECOMING EXTRATROPICAL": not yet there.
  const words = remark.toUpperCase().replace(/BECOMING\s+[A-Z/-]+(\s+LOW)?/g, ' ');
  if (/REMN/.test(words)) return 'remnant-low';
  if (/POST-?\s*TROP|EXTRA-?\s*TROP|FRONTAL|MERG/.test(words)) return 'post-tropical';
  if (/SUB-?\s*TROP/.test(words)) return 'subtropical';
  if (/DISTURBANCE|WAVE|TROUGH|POTENTIAL/.test(words)) return 'disturbance';
  if (/TROPICAL/.test(words)) return byWind(maxWindKt);
  return undefined;
}

/** A point's stage: what its remark says, else the stage before it, storm and depression told apart by the wind. */
export function carriedStage(previous: Stage | undefined, remark: string, maxWindKt: number): Stage | undefined {
  const said = stageOfRemark(remark, maxWindKt);
  if (said !== undefined) return said;
  return previous === 'tropical' || previous === 'depression' ? byWind(maxWindKt) : previous;
}

/** The storm that has ended leaves no position: `...DISSIPATED`, `...ABSORBED BY EXTRATROPICAL LOW`. */
export const saysDissipated = (remark: string): boolean => /DISSIPATED|ABSORBED/i.test(remark);
