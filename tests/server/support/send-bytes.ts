import { request, type IncomingMessage } from 'node:http';

export interface Answer {
  status: number;
  /** Undefined where the answer is no JSON. */
  body: unknown;
  text: string;
}

/** A request letter for letter, for what a well-behaved client would not send. */
export interface BytesToSend {
  method: string;
  path: string;
  headers: Record<string, string>;
  body: string | Buffer | undefined;
}

/** Sends a request and answers with what came back, also when that came before all was sent. @throws when nothing came */
export function sendBytes(base: string, { method, path, headers, body }: BytesToSend): Promise<Answer> {
  const length: Record<string, number> =
    body === undefined || 'Transfer-Encoding' in headers ? {} : { 'Content-Length': Buffer.byteLength(body) };
  return new Promise((resolve, reject) => {
    const sending = request(new URL(base).origin, { method, path, headers: { ...headers, ...length } });
    sending.on('response', (response) => {
      // A server that has heard enough answers and hangs up; what is still being sent then breaks, and says nothing more.
      sending.removeListener('error', reject).on('error', () => {});
      resolve(read(response));
    });
    sending.on('error', reject);
    sending.end(body);
  });
}

async function read(response: IncomingMessage): Promise<Answer> {
  const chunks: Buffer[] = [];
  for await (const chunk of response) chunks.push(Buffer.from(chunk));
  const text = Buffer.concat(chunks).toString('utf8');
  const status = response.statusCode ?? 0;
  try {
    return { status, text, body: JSON.parse(text) as unknown };
  } catch {
    return { status, text, body: undefined };
  }
}
