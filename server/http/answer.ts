/** What a route's handler gives back; only the router touches the response. */
export interface Answer {
  status: number;
  body?: unknown;
  /** the body as JSON text, where it was written already */
  json?: string;
  /** a file as it stands */
  bytes?: Buffer;
  /** text sent piece by piece, in place of a body */
  stream?: Iterable<string>;
  headers: Record<string, string>;
}

export const ok = (body: unknown, headers: Record<string, string> = {}): Answer => ({ status: 200, body, headers });
export const created = (body: unknown, headers: Record<string, string> = {}): Answer => ({
  status: 201,
  body,
  headers,
});
export const okJson = (json: string): Answer => ({ status: 200, json, headers: {} });
export const streamed = (stream: Iterable<string>, headers: Record<string, string>): Answer => ({
  status: 200,
  stream,
  headers,
});
export const file = (bytes: Buffer, headers: Record<string, string>): Answer => ({ status: 200, bytes, headers });
export const noContent = (): Answer => ({ status: 204, headers: {} });
