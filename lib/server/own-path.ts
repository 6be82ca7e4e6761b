const BASE = "http://own.invalid";

/**
 * Where to go after signing in: a page of ours, never another site's, whatever a link claims.
 * @returns path and query; `/` in place of anything else
 */
export function ownPath(wanted: string | null | undefined): string {
  if (wanted === null || wanted === undefined || !wanted.startsWith("/")) return "/";
  if (!URL.canParse(wanted, BASE)) return "/";
  const { origin, pathname, search } = new URL(wanted, BASE);
  // The URL standard reads `//host` and `/\host` as another host; a tab or line end between them as nothing.
  if (origin !== BASE || pathname.startsWith("//")) return "/";
  return /^\/(api|sign-in|sign-out)(\/|$)/.test(pathname) ? "/" : `${pathname}${search}`;
}
