import { z } from 'zod';

/**
 * `POST /api/operating-point`. The circuit is read by the solver, which names every problem in its record
 * (200 solved or unsolved, 422 invalid).
 */
export const operatingPointBody = z.strictObject({ circuit: z.unknown() });
export type OperatingPointBody = z.infer<typeof operatingPointBody>;
