import { fromBody, offline } from "./failure";

interface Options {
  /** version the change was made against; the server refuses with 412 or 409 when somebody else was faster */
  ifMatch?: number;
  signal?: AbortSignal;
}

async function call<T>(method: string, path: string, body?: unknown, { ifMatch, signal }: Options = {}): Promise<T> {
  const headers: Record<string, string> = { Accept: "application/json" };
  if (body !== undefined) headers["Content-Type"] = "application/json";
  if (ifMatch !== undefined) headers["If-Match"] = `"${ifMatch}"`;
  let response: Response;
  try {
    response = await fetch(`/api${path}`, {
      method,
      headers,
      credentials: "same-origin",
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
      ...(signal ? { signal } : {}),
    });
  } catch (cause) {
    if (cause instanceof DOMException && cause.name === "AbortError") throw cause;
    throw offline();
  }
  const text = await response.text();
  let answer: unknown = null;
  try {
    answer = text === "" ? null : JSON.parse(text);
  } catch {
    answer = null; // a proxy's HTML page; the status says enough
  }
  if (!response.ok) throw fromBody(response.status, answer);
  return answer as T;
}

/** JSON over fetch; every refusal is thrown as ApiFailure. Paths start after /api. */
export const api = {
  get: <T>(path: string, options?: Options) => call<T>("GET", path, undefined, options),
  post: <T>(path: string, body?: unknown, options?: Options) => call<T>("POST", path, body, options),
  put: <T>(path: string, body?: unknown, options?: Options) => call<T>("PUT", path, body, options),
  patch: <T>(path: string, body?: unknown, options?: Options) => call<T>("PATCH", path, body, options),
  delete: <T>(path: string, options?: Options) => call<T>("DELETE", path, undefined, options),
};
