/**
 * The name of the CSRF cookie, which the server writes into `<meta name="xsrf-cookie">`: `__Host-XSRF` over HTTPS,
 * `XSRF` in local mode. A page that no server filled in (its braces still stand) uses `XSRF`.
 */
export function xsrfCookieName(page: Document): string {
  const written = page.querySelector<HTMLMetaElement>('meta[name="xsrf-cookie"]')?.content ?? '';
  return written === '' || written.startsWith('{') ? 'XSRF' : written;
}
