import type { Path } from '../ui/RouteLink';

/** The id of a relation holds a slash, so it is one encoded part of the path; version included, because signed cases cite it. */
export const relationPath = ({ id, version }: { id: string; version?: number }): Path =>
  `/relations/${encodeURIComponent(version === undefined ? id : `${id}@${version}`)}`;
