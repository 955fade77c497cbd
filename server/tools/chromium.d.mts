/** The browser that is measured: CHROMIUM_PATH, or the first of the usual places. */
export function findChromium(): string | undefined;
/** The browser that the tests drive: CHROMIUM_PATH, or the lightest there is. */
export function findHeadless(): string | undefined;
