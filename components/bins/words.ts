/** A count with its noun: "1 bin", "3 bins". */
export const counted = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`;
