import path from "node:path";
import { Router } from "express";
import expressStaticGzip from "express-static-gzip";
import { notFound } from "../errors";

/** Files whose name changes with their content are kept for good; all others are asked for again each time. */
function cacheControl(file: string): string {
  return file.includes(`${path.sep}assets${path.sep}`) ? "public, max-age=31536000, immutable" : "no-cache";
}

/** The built page: its files, compressed where the build has them so, and `index.html` for every route of the page. */
export function clientFiles(folder: string): Router {
  const router = Router();
  const serve = expressStaticGzip(folder, {
    enableBrotli: true,
    orderPreference: ["br", "gz"],
    serveStatic: {
      cacheControl: false,
      setHeaders: (res, file) => res.setHeader("Cache-Control", cacheControl(file)),
    },
  });
  router.use(serve);
  router.get("/{*page}", (req, res, next) => {
    // A file that is not there is not a page.
    if (path.posix.basename(req.path).includes(".") || !req.accepts("html")) throw notFound("page");
    req.url = "/index.html";
    serve(req, res, next);
  });
  return router;
}
