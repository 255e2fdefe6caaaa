// Serves a folder to this machine only, under a content policy that lets the page reach nothing else.
import http from "node:http";
import { readFile } from "node:fs/promises";
import path from "node:path";

const TYPES = {
  ".html": "text/html; charset=utf-8", ".js": "text/javascript; charset=utf-8", ".css": "text/css; charset=utf-8", ".json": "application/json", ".map": "application/json",
  ".xml": "application/xml", ".png": "image/png", ".svg": "image/svg+xml", ".xlsx": "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet",
};

// the spreadsheet engine styles its elements from script; scripts come from here alone, which also keeps the office host's own script out
export const CONTENT_POLICY = [
  "default-src 'none'", "script-src 'self'", "style-src 'self' 'unsafe-inline'", "img-src 'self' data: blob:", "font-src 'self' data:", "connect-src 'self'",
  "frame-src 'self'", "worker-src 'self' blob:", "base-uri 'none'", "form-action 'none'", "frame-ancestors 'self'",
].join("; ");

const HEADERS = { "content-security-policy": CONTENT_POLICY, "x-content-type-options": "nosniff", "cross-origin-opener-policy": "same-origin", "referrer-policy": "no-referrer", "cache-control": "no-cache" };

/** Serves `folder` on 127.0.0.1, from `port` or the next free one. Resolves to its address and a way to stop it. */
export function serve(folder, port = 3210, tries = 20) {
  const root = path.resolve(folder);
  const server = http.createServer(async (request, response) => {
    // a page elsewhere that resolves its own name to this machine gets nothing
    const host = (request.headers.host ?? "").replace(/:\d+$/, "");
    if (host !== "127.0.0.1" && host !== "localhost") return void response.writeHead(403).end();
    if (request.method !== "GET" && request.method !== "HEAD") return void response.writeHead(405).end();
    const asked = safePath(root, request.url);
    if (!asked) return void response.writeHead(403).end();
    try {
      const body = await readFile(asked);
      response.writeHead(200, { ...HEADERS, "content-type": TYPES[path.extname(asked)] ?? "application/octet-stream" }).end(request.method === "HEAD" ? undefined : body);
    } catch {
      response.writeHead(404, HEADERS).end("not found");
    }
  });
  return new Promise((resolve, reject) => {
    let at = port, left = tries;
    server.on("error", (error) => {
      if (error.code === "EADDRINUSE" && left-- > 0) server.listen(++at, "127.0.0.1");
      else reject(error);
    });
    server.listen(at, "127.0.0.1", () => resolve({ url: `http://127.0.0.1:${server.address().port}/`, close: () => new Promise((done) => { server.close(done); server.closeAllConnections(); }) }));
  });
}

function safePath(root, url) {
  let name;
  try {
    name = decodeURIComponent(new URL(url, "http://127.0.0.1").pathname);
  } catch {
    return undefined;
  }
  const full = path.join(root, name);
  if (full !== root && !full.startsWith(root + path.sep)) return undefined;
  return name.endsWith("/") ? path.join(full, "index.html") : full;
}
