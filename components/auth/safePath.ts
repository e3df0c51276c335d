import type { Path } from '../ui/RouteLink';

/** A path of this product as a link; the one place where text becomes a typed path, whether or not the route types have been generated. */
export function asPath(text: string): Path {
  const path: unknown = text;
  return path as Path;
}

/**
 * Where to go after signing in: the path a person came from, when it is a path of this product, else the cases. Anything that
 * could lead off this origin (`//host`, `/\host`, another scheme, control characters) or back to signing in is not followed.
 */
export function safePath(to: string | string[] | undefined, otherwise = '/cases'): Path {
  const wanted = Array.isArray(to) ? to[0] : to;
  if (wanted === undefined || !/^\/(?![/\\])[^\u0000-\u001f\\]*$/.test(wanted)) return asPath(otherwise);
  const here = 'https://this.page';
  try {
    const url = new URL(wanted, here);
    if (url.origin !== here || /^\/(sign-in|forgot|reset|invitation)(\/|$)/.test(url.pathname)) return asPath(otherwise);
    return asPath(`${url.pathname}${url.search}${url.hash}`);
  } catch { return asPath(otherwise); }
}
