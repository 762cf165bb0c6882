import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";

type Mode = "right" | "hangs" | "fails" | "rubbish";

async function bodyOf(request: IncomingMessage): Promise<Buffer> {
  const parts: Buffer[] = [];
  for await (const part of request) parts.push(part as Buffer);
  return Buffer.concat(parts);
}

/** A store that speaks as much S3 as the driver does (path style), and can be told to misbehave. */
export async function fakeS3() {
  const objects = new Map<string, Buffer>();
  const state: { mode: Mode; calls: number } = { mode: "right", calls: 0 };

  async function right(request: IncomingMessage, response: ServerResponse) {
    const key = new URL(request.url ?? "/", "http://s3").pathname;
    if (request.method === "PUT") {
      const body = await bodyOf(request);
      if (body.length !== Number(request.headers["content-length"])) return response.writeHead(400).end();
      objects.set(key, body);
      return response.writeHead(200, { etag: '"x"' }).end();
    }
    if (request.method === "DELETE") {
      objects.delete(key);
      return response.writeHead(204).end();
    }
    const found = objects.get(key);
    if (!found) {
      const missing = "<Error><Code>NoSuchKey</Code><Message>none</Message></Error>";
      return response
        .writeHead(404, { "content-type": "application/xml" })
        .end(request.method === "HEAD" ? "" : missing);
    }
    return response
      .writeHead(200, { "content-length": found.length })
      .end(request.method === "HEAD" ? undefined : found);
  }

  const server = createServer((request, response) => {
    state.calls += 1;
    if (state.mode === "hangs") return;
    if (state.mode === "fails") return void response.writeHead(500).end();
    if (state.mode === "rubbish") return void response.writeHead(503, { "content-type": "text/html" }).end("<h1>hello");
    right(request, response).catch((error: unknown) => response.destroy(error as Error));
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  return {
    endpoint: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    objects,
    state,
    close: () =>
      new Promise<void>((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}
