import { connect, type Socket } from "node:net";

export interface Load {
  host: string;
  port: number;
  path: string;
  body: string;
  connections: number;
  requests: number;
}

/**
 * Sends a number of POST requests over kept connections, one at a time on each, and tells how many seconds they took.
 * Written on bare sockets: an HTTP client would cost as much as the server it measures, and hide the difference sought.
 *
 * @throws where an answer is not 200
 */
export async function send({ host, port, path, body, connections, requests }: Load): Promise<number> {
  const head = `POST ${path} HTTP/1.1\r\nhost: ${host}:${port}\r\ncontent-type: application/json\r\ncontent-length: ${Buffer.byteLength(body)}\r\n\r\n`;
  const request = Buffer.from(head + body);
  let left = requests;
  const start = performance.now();
  await Promise.all(
    Array.from({ length: connections }, () => exchange(connect(port, host), request, () => left-- > 0)),
  );
  return (performance.now() - start) / 1000;
}

function exchange(socket: Socket, request: Buffer, more: () => boolean): Promise<void> {
  return new Promise((resolve, reject) => {
    let received = "";
    const next = () => {
      if (more()) {
        socket.write(request);
        return;
      }
      socket.end();
      resolve();
    };
    socket.setNoDelay(true);
    socket.on("connect", next);
    socket.on("error", reject);
    socket.on("close", () => reject(new Error("The server closed the connection.")));
    socket.on("data", (chunk) => {
      received += chunk.toString("latin1");
      const length = wholeAnswer(received);
      if (length === undefined) return;
      if (!received.startsWith("HTTP/1.1 200")) {
        reject(new Error(`Not 200: ${received.slice(0, 400)}`));
        socket.destroy();
        return;
      }
      received = received.slice(length);
      next();
    });
  });
}

/** The length of the first answer if all of it is there. */
function wholeAnswer(text: string): number | undefined {
  const end = text.indexOf("\r\n\r\n");
  if (end < 0) return undefined;
  const stated = /\r\ncontent-length: (\d+)/i.exec(text.slice(0, end))?.[1];
  if (stated !== undefined) {
    const length = end + 4 + Number(stated);
    return text.length >= length ? length : undefined;
  }
  const last = text.indexOf("\r\n0\r\n\r\n", end);
  return last < 0 ? undefined : last + 7;
}
