/** People in whole thousandths: cells may hold fractions, and whole numbers add up to the same in any order. */
export const milli = (people: number): number => Math.round(people * 1000);
