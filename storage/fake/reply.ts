import type { ServerResponse } from "node:http";
import { Readable } from "node:stream";
import { pipeline } from "node:stream/promises";
import { writeXml, type XmlChildren } from "@/storage/fake/xml";

/** What a request is answered with. `body` streams; `xml` is a whole document. */
export type Reply = {
  status: number;
  headers?: Record<string, string | number>;
  xml?: { name: string; content: XmlChildren };
  body?: AsyncIterable<Buffer>;
};

/** Sends a reply. The headers set on the response before stay. A HEAD gets the same headers and no body. */
export async function sendReply(response: ServerResponse, method: string, reply: Reply): Promise<void> {
  const text = reply.xml && Buffer.from(writeXml(reply.xml.name, reply.xml.content));
  response.writeHead(reply.status, {
    ...(text ? { "content-type": "application/xml", "content-length": text.length } : {}),
    ...(!text && !reply.body && ![204, 304].includes(reply.status) ? { "content-length": 0 } : {}),
    ...reply.headers,
  });
  if (method === "HEAD" || (!text && !reply.body)) return void response.end();
  if (text) return void response.end(text);
  await pipeline(Readable.from(reply.body ?? [], { objectMode: false, highWaterMark: 512 * 1024 }), response);
}

/** An ISO 8601 time as the lists write it. */
export const isoTime = (ms: number): string => new Date(ms).toISOString();
