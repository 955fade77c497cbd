import { fromBody, offline } from "./failure";

interface Options {
  /** version the change was made against; the server refuses with 412 or 409 when somebody else was faster */
  ifMatch?: number;
  signal?: AbortSignal;
}

async function ask(method: string, path: string, body: unknown, { ifMatch, signal }: Options): Promise<Response> {
  const headers: Record<string, string> = { Accept: "application/json" };
  if (body !== undefined) headers["Content-Type"] = "application/json";
  if (ifMatch !== undefined) headers["If-Match"] = `"${ifMatch}"`;
  try {
    return await fetch(`/api${path}`, {
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
}

async function answerOf(response: Response): Promise<unknown> {
  const text = await response.text();
  try {
    return text === "" ? null : JSON.parse(text);
  } catch {
    return null; // a proxy's HTML page; the status says enough
  }
}

async function call<T>(method: string, path: string, body?: unknown, options: Options = {}): Promise<T> {
  const response = await ask(method, path, body, options);
  const answer = await answerOf(response);
  if (!response.ok) throw fromBody(response.status, answer);
  return answer as T;
}

async function file(path: string): Promise<Blob> {
  const response = await ask("GET", path, undefined, {});
  if (!response.ok) throw fromBody(response.status, await answerOf(response));
  return response.blob();
}

/** JSON over fetch; every refusal is thrown as ApiFailure. Paths start after /api. */
export const api = {
  /** a file as the server makes it */
  file,
  get: <T>(path: string, options?: Options) => call<T>("GET", path, undefined, options),
  post: <T>(path: string, body?: unknown, options?: Options) => call<T>("POST", path, body, options),
  put: <T>(path: string, body?: unknown, options?: Options) => call<T>("PUT", path, body, options),
  patch: <T>(path: string, body?: unknown, options?: Options) => call<T>("PATCH", path, body, options),
  delete: <T>(path: string, options?: Options) => call<T>("DELETE", path, undefined, options),
};
