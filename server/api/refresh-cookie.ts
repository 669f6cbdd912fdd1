import type { Request, Response } from 'express';

/**
 * `__Host-` and Secure on every address, also on http://localhost: browsers that keep Secure cookies of loopback treat it as
 * trustworthy, and configuration admits no other plain http.
 */
export const REFRESH_COOKIE = '__Host-tallyrod-refresh';

/** The refresh token's only way in and out. */
export interface RefreshCookie {
  read(): string | null;
  write(token: string, expiresAt: Date): void;
  clear(): void;
}

const ATTRIBUTES = { httpOnly: true, secure: true, sameSite: 'strict', path: '/' } as const;

export function refreshCookieOf(request: Request, response: Response): RefreshCookie {
  return {
    read: () => readCookie(request.headers.cookie ?? '', REFRESH_COOKIE),
    write: (token, expires) => void response.cookie(REFRESH_COOKIE, token, { ...ATTRIBUTES, expires }),
    clear: () => void response.clearCookie(REFRESH_COOKIE, ATTRIBUTES),
  };
}

function readCookie(header: string, name: string): string | null {
  for (const pair of header.split(';')) {
    const split = pair.indexOf('=');
    if (split > 0 && pair.slice(0, split).trim() === name) return pair.slice(split + 1).trim() || null;
  }
  return null;
}
