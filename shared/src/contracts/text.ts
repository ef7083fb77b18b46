import { z } from 'zod';

/** A valve's or a historian's name for a point. Valve tags stand in addresses, so they keep to safe characters. */
export const tagText = z
  .string()
  .trim()
  .min(1, 'Give the tag.')
  .max(64, 'A tag has 64 characters at most.')
  .regex(
    /^[\p{L}\p{N}][\p{L}\p{N}._-]*$/u,
    'A tag holds letters, digits, dot, dash and underscore, and starts with a letter or digit.',
  );

export const historianTagText = z
  .string()
  .trim()
  .min(1, 'Give the historian tag.')
  .max(200, 'A historian tag has 200 characters at most.');

/** An instant as it travels: ISO 8601 in UTC. */
export const instant = z.iso.datetime({ offset: true });

export const interval = z.object({ value: z.number(), low: z.number(), high: z.number() });
