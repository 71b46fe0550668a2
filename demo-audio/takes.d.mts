export const RATE: number;
/** Every take: its file and a function that computes its 16-bit samples. */
export const TAKES: readonly { readonly file: string; readonly make: () => Int16Array }[];
