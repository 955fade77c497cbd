import { existsSync } from "node:fs";
import { join, resolve } from "node:path";
import { chromium, type Browser, type BrowserContext } from "playwright-core";
import { findChromium } from "../../../server/tools/chromium.mjs";
import { startBenchServer, type BenchServer } from "../server/benchServer";

export interface BenchApp extends Pick<BenchServer, "open" | "chemistry" | "baseURL"> {
  browser: Browser;
  /** a fresh context, nothing in its cache, signed in as the demo's metallurgist */
  signedIn: () => Promise<BrowserContext>;
  end: () => Promise<void>;
}

export const benchMember = "demo-metallurgist";

/** The built client on a server of its own, and Chromium beside it. `CLIENT_FOLDER=…` for a client built elsewhere.
 *  @param fill  adds to the demo */
export async function startBenchApp(fill: Parameters<typeof startBenchServer>[0]): Promise<BenchApp> {
  const clientFolder = resolve(process.env.CLIENT_FOLDER ?? "dist/client");
  if (!existsSync(join(clientFolder, "index.html"))) throw new Error("The client is not built: npm run build.");
  const executablePath = findChromium();
  if (executablePath === undefined) throw new Error("No Chromium: see the README.");

  const { open, chemistry, baseURL, cookieOf, end } = await startBenchServer(fill, clientFolder);
  const browser = await chromium.launch({ executablePath, args: ["--disable-gpu", "--disable-background-networking"] });
  return {
    open,
    chemistry,
    baseURL,
    browser,
    signedIn: async () => {
      const [name = "", value = ""] = (await cookieOf(benchMember)).split("=");
      const context = await browser.newContext({ baseURL, viewport: { width: 1280, height: 800 } });
      await context.addCookies([{ name, value, url: baseURL }]);
      // the runner of these scripts wraps functions that are handed to the page
      await context.addInitScript("globalThis.__name ??= (f) => f");
      return context;
    },
    end: async () => {
      await browser.close();
      end();
    },
  };
}
