import { existsSync } from "node:fs";

const whole = ["/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome"];
/** The same engine without the browser's own windows, whose drawing is a quarter of the work of a test. */
const shell = "/usr/bin/chromium-headless-shell";

const first = (paths) => [process.env.CHROMIUM_PATH, ...paths].find((path) => path && existsSync(path));

/** @returns {string | undefined} the browser that is measured: CHROMIUM_PATH, or the first of the usual places */
export const findChromium = () => first([...whole, shell]);

/** @returns {string | undefined} the browser that the tests drive: CHROMIUM_PATH, or the lightest there is */
export const findHeadless = () => first([shell, ...whole]);
