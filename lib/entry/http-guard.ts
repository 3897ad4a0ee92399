import { problem } from './http-answer';

const LOOPBACK = /^(localhost|127\.0\.0\.1|::1|\[::1\])(:\d+)?$/i;

/**
 * Why a request is not let in, or null. Only this machine's own names are answered unless HOST opens the server to
 * others (a page elsewhere could point a name of its own at this machine), and a page of another site may not write.
 */
export function refused(request: Request, host = process.env.HOST): Response | null {
  const asked = request.headers.get('host') ?? new URL(request.url).host;
  const open = host !== undefined && host !== '' && !LOOPBACK.test(host);
  if (!open && !LOOPBACK.test(asked))
    return problem(
      403,
      `This server answers to localhost only, not to ${asked}. Start it with HOST set to open it to others.`,
    );
  if (request.method === 'GET' || request.method === 'HEAD') return null;
  const origin = request.headers.get('origin');
  const foreign = origin !== null && !sameHost(origin, asked);
  if (foreign || request.headers.get('sec-fetch-site') === 'cross-site')
    return problem(403, 'A page of another site may not write here.');
  return null;
}

function sameHost(origin: string, host: string): boolean {
  try {
    return (
      new URL(origin).host === host.toLowerCase().replace(/:(80|443)$/, '') ||
      new URL(origin).host === host.toLowerCase()
    );
  } catch {
    return false;
  }
}
