/** Lines are looked at this often, and areas on rows this far apart: wind changes little over less. */
export const SAMPLE_KM = 2;
