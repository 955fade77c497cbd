import { existsSync } from "node:fs";

const usual = ["/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome"];

/** @returns {string | undefined} the browser that the tests drive: CHROMIUM_PATH, or the first of the usual places */
export const findChromium = () => [process.env.CHROMIUM_PATH, ...usual].find((path) => path && existsSync(path));
