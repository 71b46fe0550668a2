/** Path of a Chromium or Chrome, or undefined. */
export function findChromium(): string | undefined;
/** Path of a Firefox, or undefined. */
export function findFirefox(): string | undefined;
/** Path of a Chromium, installed first where that is possible; says what to do where it is not. */
export function ensureChromium(): Promise<string>;
