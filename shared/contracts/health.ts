import { z } from 'zod';

/** GET /api/health: is the server up, is the database reached, is the schema whole. */
export const healthResponse = z.object({
  status: z.enum(['ok', 'degraded']), version: z.string(), engineVersion: z.string(), database: z.enum(['ok', 'unreachable']),
  schema: z.enum(['current', 'behind']), demo: z.boolean(), uptimeS: z.number(),
});
export type HealthResponse = z.infer<typeof healthResponse>;
