/** Least 1-minute wind (kt) of hurricane categories 1 to 5: the Saffir-Simpson hurricane wind scale, US National Weather Service, 2012. */
const CATEGORY_FROM_KT = [64, 83, 96, 113, 137] as const;

/** Category 1 to 5 of a maximum 1-minute sustained wind; 0 below hurricane force. */
export const saffirSimpsonCategory = (maxWindKt: number): 0 | 1 | 2 | 3 | 4 | 5 => CATEGORY_FROM_KT.filter((kt) => maxWindKt >= kt).length as 0 | 1 | 2 | 3 | 4 | 5;
