import { readFileSync } from "node:fs";
import path from "node:path";
import { Router } from "express";
import expressStaticGzip from "express-static-gzip";
import { notFound } from "../errors";
import { nonceOf } from "./securityHeaders";

/** Files whose name changes with their content are kept for good; all others are asked for again each time. */
function cacheControl(file: string): string {
  return file.includes(`${path.sep}assets${path.sep}`) ? "public, max-age=31536000, immutable" : "no-cache";
}

/**
 * The built page: its files, compressed where the build has them so, and for every route of the page `index.html`,
 * which is told the token that its style elements need.
 */
export function clientFiles(folder: string): Router {
  const page = readFileSync(path.join(folder, "index.html"), "utf8");
  const router = Router();
  router.get("/index.html", (_req, res) => res.redirect(301, "/"));
  router.use(
    expressStaticGzip(folder, {
      enableBrotli: true,
      orderPreference: ["br", "gz"],
      index: false,
      serveStatic: {
        index: false,
        redirect: false,
        cacheControl: false,
        setHeaders: (res, file) => res.setHeader("Cache-Control", cacheControl(file)),
      },
    }),
  );
  router.get("/{*page}", (req, res) => {
    // A file that is not there is not a page.
    if (path.posix.basename(req.path).includes(".") || !req.accepts("html")) throw notFound("page");
    const meta = `<meta property="csp-nonce" nonce="${nonceOf(res)}" />`;
    res
      .set("Cache-Control", "no-store")
      .type("html")
      .send(page.replace("<head>", `<head>${meta}`));
  });
  return router;
}
