import { existsSync } from "node:fs";
import { join } from "node:path";
import type { RequestHandler } from "express";
import sirv from "sirv";

const hashed = /^\/assets\/[^/]+\.\w+$/;

const notBuilt: RequestHandler = (_req, res) => {
  res
    .status(404)
    .type("text")
    .send("The pages are not built: `npm run build`, or open the address `npm run dev` names.");
};

/** The built pages. What the build named by its content is cached for good, index.html is asked for each time, and a path
 *  without extension that is no file gets index.html. The .br and .gz files of the build go to those who take them. */
export function clientFiles(folder: string): RequestHandler {
  if (!existsSync(join(folder, "index.html"))) return notBuilt;
  return sirv(folder, {
    brotli: true,
    gzip: true,
    etag: true,
    single: true,
    setHeaders: (res, path) => {
      res.setHeader("Cache-Control", hashed.test(path) ? "public, max-age=31536000, immutable" : "no-cache");
    },
  });
}

export const noSuchFile: RequestHandler = (_req, res) => {
  res.status(404).type("text").send("There is no such file.");
};
