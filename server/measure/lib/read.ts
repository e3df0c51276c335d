/** Readers for JSON whose shape another program made: each gives the value or undefined, never a guess. */
export const asRecord = (value: unknown): Record<string, unknown> | undefined =>
  typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Record<string, unknown>) : undefined;
export const asNumber = (value: unknown): number | undefined => (typeof value === 'number' && Number.isFinite(value) ? value : undefined);
export const asText = (value: unknown): string | undefined => (typeof value === 'string' ? value : undefined);
export const asList = (value: unknown): unknown[] | undefined => (Array.isArray(value) ? (value as unknown[]) : undefined);
